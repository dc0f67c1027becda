import pytest

from bidcheck.numerals import UnreadableNumeral, looks_like_thousands, read_numeral, split_quantity


@pytest.mark.parametrize(
    ("text", "value", "half_digit"),
    [
        ("84", 84, 0.5),
        ("0.825", 0.825, 0.0005),
        ("4,5", 4.5, 0.05),
        ("62.", 62, 0.5),
        (".5", 0.5, 0.05),
        ("1e2", 100, 50),
    ],
)
def test_value_and_half_of_the_last_place(text, value, half_digit):
    assert read_numeral(text) == pytest.approx((value, half_digit))


@pytest.mark.parametrize(
    ("text", "fault", "cures"),
    [
        ("1 200", "has a thousands mark", ("1200",)),
        ("1'200", "has a thousands mark", ("1200",)),
        ("1,200", "can be read in two ways", ("1200", "1.200")),
        ("1,200,000", "has thousands marks", ("1200000",)),
        ("1.200.000", "has thousands marks", ("1200000",)),
        ("1,200.5", "has a thousands mark", ("1200.5",)),
        ("1.200,5", "has a thousands mark", ("1200.5",)),
        ("1.2.3", "is not a number", ()),
        ("nan", "is not a number", ()),
        ("-", "is not a number", ()),
        ("", "is not a number", ()),
        ("1e400", "is not a number of ordinary size", ()),
        ("0e400", "is not a number of ordinary size", ()),
        ("1" * 60, "is not a number of ordinary size", ()),
    ],
)
def test_what_is_not_one_number(text, fault, cures):
    with pytest.raises(UnreadableNumeral) as caught:
        read_numeral(text)
    assert (caught.value.fault, caught.value.cures) == (fault, cures)


def test_comma_known_to_be_decimal():
    assert read_numeral("1,200", comma_is_decimal=True).value == 1.2


def test_thousands_in_a_column():
    assert looks_like_thousands(["800", "1,200"])
    assert not looks_like_thousands(["800", "1.2"])
    assert not looks_like_thousands(["1.000", "1.200"])
    assert not looks_like_thousands(["800", "900"])


def test_long_texts_cost_no_time():
    """A pattern that tries every split of a run of digits would take hours here."""
    assert split_quantity("1" * 100_000 + "x")[1] == "x"
    with pytest.raises(UnreadableNumeral):
        read_numeral("1" * 100_000 + "x")
    with pytest.raises(UnreadableNumeral):
        read_numeral("1," * 50_000 + "x")


def test_split_without_a_number():
    assert split_quantity("m3/h") == ("", "m3/h")

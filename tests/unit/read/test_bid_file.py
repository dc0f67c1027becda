import pytest

from bidcheck.errors import InputError
from bidcheck.read import read_inquiry
from tests.build_files import BID, CURVE, write_bid, write_inquiry

FULL = """\
bidder = "birch"
revision = "a"
title = "Birch pumps"
model = "X 1"
arrangement = "Double  Suction"
stages = 2
suction_eyes = 2
inducer = true
speed = "1480 rpm"
drive = "variable"
casing_type = "volute"
impeller_rated = "412 mm"
impeller_max = "430 mm"
impeller_min = "13.4 in"
performance_basis = "pump"
references = 0
[claims]
head = "62.3 m"
efficiency = "82.5 %"
power = "92.4 kW"
npsh3 = "4.2 m"
bep_flow = "460 m3/h"
bep_efficiency = 0.83
shutoff_head = "74 m"
min_continuous_flow = "140 m3/h"
max_allowable_flow = "560 m3/h"
max_power = "101 kW"
[guarantee]
standard = "ISO 9906:2012"
grade = "2B"
what = "power"
[driver]
rating = "110 kW"
speed = "1485 rpm"
efficiency = "95.4 %"
poles = 4
frequency = "50 Hz"
[casing]
max_pressure = "16 bar"
[commercial]
price = "78400 EUR"
delivery = "18 weeks"
validity = "90 days"
[[commercial.adders]]
item = "test"
amount = "2400 EUR"
[[commercial.adders]]
item = "rebate"
amount = "-400 EUR"
[[exceptions]]
clause = "4.3"
text = "no"
[[curves]]
file = "curve.csv"
speed = "1450 rpm"
stages = 1
liquid = "as pumped"
power_at = "motor input"
"""


def read(tmp_path, bid, curve=CURVE):
    return read_inquiry(write_inquiry(tmp_path, bid=bid, curve=curve)).bids[0]


def refused(tmp_path, bid):
    with pytest.raises(InputError) as caught:
        read(tmp_path, bid)
    return [str(problem) for problem in caught.value.problems]


def test_every_key_reaches_the_object(tmp_path):
    bid = read(tmp_path, FULL)
    assert (bid.name, bid.folder, bid.title, bid.model) == ("birch a", "bids/birch", "Birch pumps", "X 1")
    assert (bid.arrangement, bid.stages, bid.suction_eyes, bid.inducer) == ("double suction", 2, 2, True)
    assert (bid.speed_rpm, bid.drive, bid.casing_type, bid.performance_basis) == (1480.0, "variable", "volute", "pump")
    assert (bid.impeller_rated, bid.impeller_max) == pytest.approx((0.412, 0.43))
    assert bid.impeller_min == pytest.approx(0.34036)
    assert bid.references == 0
    assert (bid.claims.efficiency.value, bid.claims.efficiency.half_digit) == pytest.approx((0.825, 0.0005))
    assert bid.claims.bep_efficiency.value == 0.83
    assert all(getattr(bid.claims, key) is not None for key in type(bid.claims).__slots__)
    assert bid.guarantee.what == "power"
    assert (bid.driver.rating, bid.driver.poles, bid.driver.efficiency) == pytest.approx((110e3, 4, 0.954))
    assert bid.casing.max_pressure == pytest.approx(1.6e6)
    assert (bid.commercial.price, bid.commercial.currency) == (78400.0, "EUR")
    assert [adder.amount for adder in bid.commercial.adders] == [2400.0, -400.0]
    assert bid.exceptions[0].clause == "4.3"
    (curve,) = bid.curves
    assert (curve.file, curve.impeller, curve.speed_rpm, curve.stages) == ("bids/birch/curve.csv", 0.412, 1450.0, 1)
    assert (curve.liquid, curve.power_at, curve.density) == ("as pumped", "motor input", 1050.0)
    assert {item.what: item.value for item in bid.assumptions} == {
        "impeller diameter of curve curve.csv": "412 mm",
        "density of curve curve.csv": "1050 kg/m³",
    }


def test_what_absent_keys_mean_is_assumed_openly(tmp_path):
    bid = read(
        tmp_path,
        'bidder = "birch"\narrangement = "double suction"\nspeed = "990 rpm"\n[[curves]]\nfile = "curve.csv"\n',
    )
    (curve,) = bid.curves
    assert (bid.stages, bid.suction_eyes, bid.inducer, bid.drive) == (1, 2, False, "fixed")
    assert (curve.impeller, curve.speed_rpm, curve.stages, curve.liquid) == (None, 990.0, 1, "water")
    assert (curve.density, curve.power_at) == (998.2, "shaft")
    assert [item.what for item in bid.assumptions] == [
        "stages",
        "suction eyes",
        "speed of curve curve.csv",
        "liquid of curve curve.csv",
        "density of curve curve.csv",
        "power of curve curve.csv",
        "inducer",
        "drive",
    ]


def test_stated_plainly_nothing_is_assumed(tmp_path):
    assert read(tmp_path, BID).assumptions == ()


def test_head_of_all_stages_where_the_curve_does_not_say(tmp_path):
    bid = read(tmp_path, BID.replace("stages = 1", "stages = 6"))
    assert bid.curves[0].stages == 6
    assert bid.assumptions[0].what == "stages of curve curve.csv"


def test_missing_keys_come_with_an_example(tmp_path):
    found = refused(tmp_path, "stages = 1\n")
    assert 'bids/birch/bid.toml: bidder is missing; write bidder = "birch"' in found
    assert any("arrangement is missing; write arrangement = " in text for text in found)
    assert 'bids/birch/bid.toml: speed is missing; write speed = "1480 rpm"' in found
    assert any("[[curves]]" in text for text in found)


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        (
            'head = "62.3 m"',
            'head = "62"',
            'bids/birch/bid.toml:18: [claims] head: found "62", which has no unit; write "62 m"',
        ),
        (
            'efficiency = "82.5 %"',
            'efficiency = "825 %"',
            ':19: [claims] efficiency: found "825 %", an efficiency above 100 %',
        ),
        ('efficiency = "82.5 %"', "efficiency = 82.5", 'write "82.5 %" or "0.825"'),
        ('efficiency = "82.5 %"', "efficiency = 0.0", 'found "0.0", must be above zero'),
        ('bidder = "birch"', 'bidder = "Birch Ltd"', 'found "Birch Ltd" in folder "birch"; write bidder = "birch"'),
        ('revision = "a"', 'revision = "b"', 'revision: found "b" in the folder of revision a'),
        ('"Double  Suction"', '"split case"', 'arrangement: found "split case"; known are'),
        ("suction_eyes = 2", "suction_eyes = 3", "found 3, an impeller has 1 or 2"),
        ("inducer = true", 'inducer = "yes"', "write inducer = true or inducer = false"),
        ('speed = "1480 rpm"', 'speed = "0 rpm"', 'speed: found "0 rpm", must be above zero'),
        ("references = 0", "references = -1", "found -1, must be 0 or more"),
        ("poles = 4", "poles = 3", "[driver] poles: found 3, poles come in pairs"),
        ('max_pressure = "16 bar"', 'max_pressure = "16 bar(a)"', "[casing] max_pressure: found"),
        ('price = "78400 EUR"', 'price = "78,400 EUR"', 'write "78400 EUR" or "78.400 EUR"'),
        ('price = "78400 EUR"', 'price = "78400 USD"', "is in EUR, other amounts of this bid are in USD"),
        ('item = "test"\n', "", "[[commercial.adders]] item is missing"),
        ('clause = "4.3"\n', "", "[[exceptions]] clause is missing"),
        ('what = "power"', 'what = "both"', "[guarantee] what: found"),
        (
            'power_at = "motor input"',
            'power_at = "motor"',
            'nearest is "motor input"; write one of: shaft, motor input',
        ),
        ('file = "curve.csv"', 'file = "curv.csv"', "bids/birch/curv.csv: there is no such file"),
        ('file = "curve.csv"\n', "", '[[curves]] file is missing; write file = "curve.csv"'),
        ('file = "curve.csv"', 'file = "curve.csv"\nimpellr = "1 mm"', 'impellr: is not known; nearest is "impeller"'),
        ("stages = 2", "", None),
    ],
)
def test_wrong_values_are_named(tmp_path, old, new, message):
    assert old in FULL
    if message is None:
        assert read(tmp_path, FULL.replace(old, new, 1)).stages == 1
        return
    assert any(message in text for text in refused(tmp_path, FULL.replace(old, new, 1)))


def test_a_multistage_pump_states_its_stages(tmp_path):
    text = BID.replace("end suction", "vertical multistage").replace("stages = 1\n", "")
    assert any("stages is missing; write stages = 6" in problem for problem in refused(tmp_path, text))


SECOND = '[[curves]]\nfile = "curve2.csv"\nimpeller = "430 mm"\n'


def test_several_curves(tmp_path):
    root = write_inquiry(tmp_path, bid=BID + SECOND)
    (root / "bids/birch/curve2.csv").write_text(CURVE)
    assert [curve.impeller for curve in read_inquiry(root).bids[0].curves] == pytest.approx([0.412, 0.43])


@pytest.mark.parametrize(
    ("second", "message"),
    [
        (SECOND.replace("430", "412"), "[[curves]] impeller: 412 mm has a curve already; each diameter has one"),
        (SECOND.replace("430 mm", "0.412 m"), "[[curves]] impeller: 412 mm has a curve already"),
        (SECOND.replace("curve2.csv", "curve.csv"), '"curve.csv" is the file of another curve already'),
    ],
)
def test_curves_that_cannot_be_told_apart(tmp_path, second, message):
    root = write_inquiry(tmp_path, bid=BID + second)
    (root / "bids/birch/curve2.csv").write_text(CURVE)
    with pytest.raises(InputError) as caught:
        read_inquiry(root)
    assert message in str(caught.value)


def test_two_curves_without_any_diameter(tmp_path):
    head = 'bidder = "birch"\narrangement = "in-line"\nspeed = "990 rpm"\n'
    text = head + '[[curves]]\nfile = "curve.csv"\n[[curves]]\nfile = "b.csv"\n'
    assert any("is given for neither of two curves" in problem for problem in refused(tmp_path, text))


@pytest.mark.parametrize("name", ["../alder/curve.csv", "/etc/hostname", "..\\\\x.csv", "C:\\\\x.csv", "a/../../x.csv"])
def test_curve_files_stay_in_the_folder_of_the_bid(tmp_path, name):
    found = refused(tmp_path, BID.replace('"curve.csv"', f'"{name}"'))
    assert any("leads out of the folder of the bid" in text for text in found)


def test_a_link_out_of_the_folder_is_refused(tmp_path):
    root = write_inquiry(tmp_path / "inquiry", bid=BID.replace("curve.csv", "link.csv"))
    (tmp_path / "secret.csv").write_text(CURVE)
    (root / "bids/birch/link.csv").symlink_to(tmp_path / "secret.csv")
    with pytest.raises(InputError, match="leads out of the folder of the bid"):
        read_inquiry(root)


def test_a_link_inside_the_folder_is_followed(tmp_path):
    root = write_inquiry(tmp_path, bid=BID.replace("curve.csv", "link.csv"))
    (root / "bids/birch/link.csv").symlink_to(root / "bids/birch/curve.csv")
    assert len(read_inquiry(root).bids[0].curves) == 1


def test_problems_of_bid_and_curve_come_together(tmp_path):
    root = write_inquiry(tmp_path, bid=BID.replace('"1480 rpm"', '"fast"', 1), curve=CURVE.replace("70.9", "x"))
    write_bid(root, "alder", curve=CURVE.replace("62.1", "621"))
    with pytest.raises(InputError) as caught:
        read_inquiry(root)
    assert [(problem.file, problem.line) for problem in caught.value.problems] == [
        ("bids/alder/curve.csv", 3),
        ("bids/birch/bid.toml", 3),
        ("bids/birch/curve.csv", 3),
    ]

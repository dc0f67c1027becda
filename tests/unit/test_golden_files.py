"""The comparison with golden files can fail, says how to mend it, and writes only when told to."""

import pytest

from tests.golden_files import hold_against


def test_equal_passes(tmp_path):
    (tmp_path / "a").write_bytes(b"one\ntwo\n")
    hold_against(tmp_path / "a", "one\ntwo\n", update=False)


@pytest.mark.parametrize("kept", [b"one\n", b"one\r\ntwo\r\n", b"one\ntwo"])
def test_any_difference_fails_and_names_the_flag(tmp_path, kept):
    (tmp_path / "a").write_bytes(kept)
    with pytest.raises(pytest.fail.Exception, match="--update-golden"):
        hold_against(tmp_path / "a", "one\ntwo\n", update=False)
    assert (tmp_path / "a").read_bytes() == kept


def test_a_missing_file_fails_and_is_not_made(tmp_path):
    with pytest.raises(pytest.fail.Exception, match="--update-golden"):
        hold_against(tmp_path / "a", "one\n", update=False)
    assert not (tmp_path / "a").exists()


def test_the_flag_rewrites(tmp_path):
    hold_against(tmp_path / "new" / "a", "one\n", update=True)
    assert (tmp_path / "new" / "a").read_bytes() == b"one\n"

import pytest

from bidcheck.errors import InputError, Problem
from bidcheck.read import source as source_module
from bidcheck.read.source import capped, decode, read_text


@pytest.mark.parametrize("encoding", ["utf-8", "utf-8-sig", "utf-16", "cp1252", "latin-1"])
@pytest.mark.parametrize("end", ["\n", "\r\n", "\r"])
def test_encodings_and_line_ends(encoding, end):
    text = f"flow [m³/h], temperature [°C]{end}1,2{end}"
    assert decode(text.encode(encoding), "x") == "flow [m³/h], temperature [°C]\n1,2\n"


def test_bytes_no_encoding_of_windows_knows():
    assert decode(b"\x81\xe9", "x") == "\x81é"


def test_not_text():
    with pytest.raises(InputError, match="x: is not a text file; save it as text or CSV in UTF-8"):
        decode(b"PK\x03\x04\x00\x00", "x")


def test_missing_folder_and_large(tmp_path, monkeypatch):
    with pytest.raises(InputError, match="there is no such file"):
        read_text(tmp_path / "curve.csv", "curve.csv", [])
    with pytest.raises(InputError, match="is a folder, a file is needed"):
        read_text(tmp_path, "curve.csv", [])
    with pytest.raises(InputError, match="cannot be opened"):
        read_text(tmp_path / ("x" * 300), "curve.csv", [])
    (tmp_path / "a").write_bytes(b"x" * 11)
    monkeypatch.setattr(source_module, "LARGEST_FILE", 11)
    assert read_text(tmp_path / "a", "a", []) == "x" * 11
    monkeypatch.setattr(source_module, "LARGEST_FILE", 10)
    with pytest.raises(InputError, match="is it the right file"):
        read_text(tmp_path / "a", "a", [])


def test_problems_are_capped_and_counted():
    many = [Problem("f", f"p{n}", n) for n in range(30, 0, -1)]
    shown = capped(many)
    assert len(shown) == 21
    assert shown[0].line == 1
    assert shown[-1].text == "and 10 more problems in this file; mend these first"
    assert capped(many[:20])[-1].line == 30
    assert len(capped(many[:20])) == 20

from pathlib import Path

from bidcheck.limits import limit_names
from bidcheck.read.spelling_tables import files_tables, with_tables

DOCUMENT = Path(__file__).parents[3] / "docs" / "files.md"


def test_document_is_current(golden):
    text = DOCUMENT.read_text(encoding="utf-8")
    golden("docs/files.md", with_tables(text))
    for table in files_tables().values():
        assert table in text


def test_every_limit_is_listed():
    table = files_tables()["limits"]
    assert all(f"| `{name}` |" in table for name in limit_names())
    assert "at most 11000 US" in table
    assert "at least 95 %, mandatory" in table


def test_every_key_read_is_documented(tmp_path, monkeypatch):
    """Keys are collected where they are asked for, so a new one without a line in the document fails here."""
    from bidcheck.read import read_inquiry
    from bidcheck.read.table import Table
    from tests.build_files import write_inquiry
    from tests.unit.read.test_bid_file import FULL as BID
    from tests.unit.read.test_inquiry_file import FULL as INQUIRY

    asked = set()
    get = Table._get
    monkeypatch.setattr(Table, "_get", lambda self, key: asked.add((self.name, key)) or get(self, key))
    read_inquiry(write_inquiry(tmp_path, INQUIRY, BID))
    text = DOCUMENT.read_text(encoding="utf-8")
    assert len(asked) > 80
    for table, key in asked:
        if table.startswith("[limits."):
            assert f"{key} = " in text, key
            continue
        assert f"`{key}`" in text or f"{key}]" in text, (table, key)
        assert not table or f"`{table}`" in text, table


def test_the_examples_of_the_document_are_read(tmp_path):
    import re

    from bidcheck.read import read_inquiry

    text = DOCUMENT.read_text(encoding="utf-8")
    inquiry, bid = re.findall(r"```toml\n(.*?)```", text, re.DOTALL)
    curve = re.findall(r"```\n(flow .*?)```", text, re.DOTALL)[0]
    (tmp_path / "bids/alder").mkdir(parents=True)
    inquiry = inquiry.replace('name = "water"', 'name = "brine"\ndensity = "1.1 SG"')
    (tmp_path / "inquiry.toml").write_text(inquiry, encoding="utf-8")
    (tmp_path / "bids/alder/bid.toml").write_text(bid, encoding="utf-8")
    (tmp_path / "bids/alder/curve.csv").write_text(curve, encoding="utf-8")
    assert read_inquiry(tmp_path).bids[0].name == "alder a"

import hashlib

import pytest

from bidcheck.errors import InputError
from bidcheck.read import read_curve_file, read_inquiry
from tests.build_files import BID, CURVE, INQUIRY, write_bid, write_inquiry


def refused(root, **options):
    with pytest.raises(InputError) as caught:
        read_inquiry(root, **options)
    return [str(problem) for problem in caught.value.problems]


def test_bids_and_revisions_in_order_with_hashes(tmp_path):
    root = write_inquiry(tmp_path)
    for bidder, revision in (("larch", "b"), ("larch", "a"), ("alder", "")):
        write_bid(root, bidder, revision=revision)
    (root / "bids" / ".hidden").mkdir()
    (root / "bids" / "readme.txt").write_text("x")
    (root / "bids" / "larch" / "letters").mkdir()
    inquiry = read_inquiry(root)
    assert [bid.name for bid in inquiry.bids] == ["alder a", "birch a", "larch a", "larch b"]
    assert [bid.folder for bid in inquiry.bids][2:] == ["bids/larch/a", "bids/larch/b"]
    assert [item.file for item in inquiry.inputs] == [
        "inquiry.toml",
        *(
            f"bids/{name}/{file}"
            for name in ("alder", "birch", "larch/a", "larch/b")
            for file in ("bid.toml", "curve.csv")
        ),
    ]
    assert inquiry.inputs[0].sha256 == hashlib.sha256(INQUIRY.encode()).hexdigest()
    assert read_inquiry(str(root)).inputs == inquiry.inputs


def test_folders_that_are_no_inquiry(tmp_path):
    assert "there is no such folder" in refused(tmp_path / "none")[0]
    assert "cannot be opened" in refused("x" * 300)[0]
    (tmp_path / "file").write_text("x")
    assert "is a file; give the folder that holds inquiry.toml" in refused(tmp_path / "file")[0]
    assert "holds no inquiry.toml" in refused(tmp_path)[0]
    (tmp_path / "inquiry.toml").write_text(INQUIRY)
    assert refused(tmp_path) == ["bids: there is no folder of bids; put each bid into bids/NAME/bid.toml"]
    (tmp_path / "bids").mkdir()
    assert refused(tmp_path) == ["bids: holds no bid; put each bid into bids/NAME/bid.toml"]


def test_bid_folders_that_are_wrong(tmp_path):
    root = write_inquiry(tmp_path)
    (root / "bids/empty").mkdir()
    (root / "bids/stray.toml").write_text(BID)
    write_bid(root, "mixed")
    write_bid(root, "mixed", revision="b")
    write_bid(root, "named", revision="rev2")
    (root / "bids/gap/a").mkdir(parents=True)
    found = refused(root)
    assert found == [
        "bids/stray.toml: lies outside the folder of a bid; put it into bids/NAME/",
        "bids/empty: holds neither bid.toml nor folders of revisions a, b, c ...",
        "bids/gap/a/bid.toml: there is no such file",
        "bids/mixed: holds a bid.toml and folders of revisions (b) as well; move bid.toml and its curves into one",
        "bids/named/rev2: holds a bid.toml but is not named by revision; name it a, b, c ...",
    ]


def test_revision_key_agrees_with_its_folder(tmp_path):
    root = write_inquiry(tmp_path)
    write_bid(root, "larch", 'revision = "a"\n' + BID, revision="b")
    assert 'revision: found "a" in the folder of revision b' in refused(root)[0]


def test_unreadable_bids_can_be_left_out(tmp_path):
    root = write_inquiry(tmp_path)
    write_bid(root, "alder", curve="x")
    write_bid(root, "elm", revision="a")
    write_bid(root, "elm", bid="not toml", revision="b")
    write_bid(root, "larch", bid="not toml", revision="a")
    write_bid(root, "larch", revision="b")
    (root / "bids/oak").mkdir()
    assert len(refused(root)) == 4
    inquiry = read_inquiry(root, skip_unreadable=True)
    assert [bid.name for bid in inquiry.bids] == ["birch a", "larch b"]
    assert [bid.bidder for bid in inquiry.unreadable] == ["alder", "elm", "larch a", "oak"]
    assert all(bid.problems for bid in inquiry.unreadable)


def test_skipping_never_hides_the_inquiry_or_the_last_bid(tmp_path):
    root = write_inquiry(tmp_path, bid="not toml")
    assert "bids/birch/bid.toml" in refused(root, skip_unreadable=True)[0]
    write_inquiry(tmp_path, inquiry="x")
    assert "inquiry.toml" in refused(root, skip_unreadable=True)[0]


def test_problems_of_one_file_are_capped(tmp_path):
    rows = "\n".join(f"{n + 1000}, x, 80, 90, 5" for n in range(30))
    root = write_inquiry(tmp_path, curve=CURVE + rows)
    found = refused(root)
    assert len(found) == 21
    assert found[-1] == "bids/birch/curve.csv: and 10 more problems in this file; mend these first"


def test_utf16_curve_and_latin1_bid(tmp_path):
    root = write_inquiry(tmp_path, curve=CURVE.replace("m3/h", "m³/h").replace("\n", "\r\n").encode("utf-16"))
    (root / "bids/birch/bid.toml").write_bytes(('title = "Bürch"\n' + BID).encode("latin-1"))
    bid = read_inquiry(root).bids[0]
    assert bid.title == "Bürch"
    assert bid.curves[0].head.line.tolist() == [2, 3, 4, 5]


def test_a_curve_file_alone(tmp_path):
    file = tmp_path / "curve.csv"
    file.write_text(CURVE)
    (curve,) = read_curve_file(file, speed_rpm=1480.0)
    assert (curve.speed_rpm, curve.density, curve.liquid, curve.power_at) == (1480.0, 998.2, "water", "shaft")
    assert (curve.impeller, curve.stages, curve.file) == (None, 1, str(file))
    with pytest.raises(ValueError, match="above zero"):
        read_curve_file(file, speed_rpm=0.0)
    file.write_text(CURVE.replace("70.9", "x"))
    with pytest.raises(InputError, match=':3: head "x" is not a number'):
        read_curve_file(str(file), speed_rpm=1480.0)

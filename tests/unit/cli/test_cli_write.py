"""Files are written whole or not at all."""

import os
from pathlib import Path

import pytest

from bidcheck.cli.write import write_atomically


def test_utf8_and_plain_newlines_whatever_the_system(tmp_path):
    write_atomically(tmp_path / "a.txt", "m³/h\nη\n")
    assert (tmp_path / "a.txt").read_bytes() == "m³/h\nη\n".encode()


def test_a_failure_leaves_the_old_file_and_nothing_beside_it(tmp_path, monkeypatch):
    target = tmp_path / "a.txt"
    target.write_text("old", encoding="utf-8")

    def fails(_self, _target):
        raise OSError(13, "Permission denied")

    monkeypatch.setattr(Path, "replace", fails)
    with pytest.raises(OSError, match=r"Permission denied.*a\.txt"):
        write_atomically(target, "new")
    assert [path.name for path in tmp_path.iterdir()] == ["a.txt"]
    assert target.read_text(encoding="utf-8") == "old"


def test_permissions_of_a_file_are_kept_and_new_files_follow_the_mask(tmp_path):
    kept, new = tmp_path / "kept", tmp_path / "new"
    kept.write_text("old", encoding="utf-8")
    kept.chmod(0o600)
    mask = os.umask(0o027)
    try:
        write_atomically(kept, "x")
        write_atomically(new, "x")
    finally:
        os.umask(mask)
    assert (kept.stat().st_mode & 0o777, new.stat().st_mode & 0o777) == (0o600, 0o640)


def test_a_link_is_followed(tmp_path):
    (tmp_path / "file").write_text("old", encoding="utf-8")
    (tmp_path / "link").symlink_to(tmp_path / "file")
    write_atomically(tmp_path / "link", "new")
    assert (tmp_path / "link").is_symlink()
    assert (tmp_path / "file").read_text(encoding="utf-8") == "new"


def test_a_device_is_written_to_and_not_replaced():
    write_atomically(Path(os.devnull), "text")
    assert Path(os.devnull).is_char_device()


def test_a_missing_folder_is_an_error_that_names_the_file(tmp_path):
    with pytest.raises(OSError, match=r"nowhere.a\.txt"):
        write_atomically(tmp_path / "nowhere" / "a.txt", "x")

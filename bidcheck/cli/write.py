"""Files out: written beside and renamed, so that a file is either the old one or the new one."""

import contextlib
import os
import tempfile
from pathlib import Path


def write_atomically(path: Path, text: str) -> None:
    """Write text as UTF-8 with plain newlines; the folder must exist.

    A file that is there already keeps its permissions; a link is followed; a device is written to, not replaced.

    Raises
    ------
    OSError
        Naming `path`, if it cannot be written; nothing is left behind.
    """
    target = Path(os.path.realpath(path))
    try:
        if target.exists() and not target.is_file():
            target.write_text(text, encoding="utf-8", newline="\n")
        else:
            _replace(target, text)
    except OSError as error:
        raise OSError(error.errno, error.strerror, str(path)) from error


def _replace(target: Path, text: str) -> None:
    """Write a new file beside `target` and give it its name."""
    mode = _mode(target)
    handle, name = tempfile.mkstemp(dir=target.parent, prefix=".bidcheck-", suffix=".part")
    beside = Path(name)
    try:
        with os.fdopen(handle, "w", encoding="utf-8", newline="\n") as stream:
            stream.write(text)
        beside.chmod(mode)
        beside.replace(target)
    except BaseException:
        with contextlib.suppress(OSError):
            beside.unlink()
        raise


def _mode(target: Path) -> int:
    """Permissions of the file that is there, else those of any new file."""
    if target.exists():
        return target.stat().st_mode & 0o777
    mask = os.umask(0)
    os.umask(mask)
    return 0o666 & ~mask

"""Files out: written beside and renamed, so that a file is either the old one or the new one."""

import contextlib
import os
import tempfile
from pathlib import Path


def write_atomically(path: Path, text: str) -> None:
    """Write text as UTF-8 with plain newlines; the folder must exist.

    Raises
    ------
    OSError
        If the folder cannot be written to; nothing is left behind.
    """
    handle, name = tempfile.mkstemp(dir=path.parent, prefix=f".{path.name}.", suffix=".part")
    beside = Path(name)
    try:
        with os.fdopen(handle, "w", encoding="utf-8", newline="\n") as stream:
            stream.write(text)
        mask = os.umask(0)
        os.umask(mask)
        beside.chmod(0o666 & ~mask)
        beside.replace(path)
    except BaseException:
        with contextlib.suppress(OSError):
            beside.unlink()
        raise

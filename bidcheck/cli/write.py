"""The only place that writes files: beside the target first, then put in its place at once."""

import os
import tempfile
from pathlib import Path


def write_atomically(path: Path, text: str) -> None:
    """Write text in UTF-8 so that `path` holds either its former content or all of the new.

    Parameters
    ----------
    path : Path
        Its folder must exist.
    text : str
        Written as it is; line ends are not translated.

    Raises
    ------
    OSError
        If the folder or the file cannot be written. Nothing is left behind.
    """
    handle, name = tempfile.mkstemp(prefix=f".{path.name}.", suffix=".part", dir=path.parent)
    beside = Path(name)
    try:
        with os.fdopen(handle, "w", encoding="utf-8", newline="") as file:
            file.write(text)
        beside.chmod(_usual_mode())
        beside.replace(path)
    except BaseException:
        beside.unlink(missing_ok=True)
        raise


def _usual_mode() -> int:
    """Permissions of an ordinary new file; temporary files are readable by their owner alone."""
    mask = os.umask(0)
    os.umask(mask)
    return 0o666 & ~mask

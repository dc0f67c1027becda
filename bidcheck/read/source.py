"""A file being read: its bytes within bounds, its text whatever the encoding, and the problems found in it."""

import hashlib
from dataclasses import dataclass, field
from pathlib import Path

from bidcheck.errors import InputError, Problem
from bidcheck.inquiry import InputFile
from bidcheck.quantity import Assumption
from bidcheck.read.toml_lines import Lines, line_of

LARGEST_FILE = 5_000_000
"""Bytes; a bound against mistakes, no curve or bid comes near it (no source)."""
MOST_PROBLEMS = 20
"""Problems shown per file; the rest are counted."""

_UTF16_MARKS = (b"\xff\xfe", b"\xfe\xff")


@dataclass(slots=True)
class Source:
    """One file while it is read. `lines` is empty where the file is not TOML."""

    file: str
    lines: Lines = field(default_factory=dict)
    problems: list[Problem] = field(default_factory=list)
    assumptions: list[Assumption] = field(default_factory=list)

    def problem(self, text: str, line: int | None = None, column: int | None = None) -> None:
        """Note something wrong with the file."""
        self.problems.append(Problem(self.file, text, line, column))

    def problem_at(self, path: tuple[str | int, ...], text: str) -> None:
        """Note something wrong with a key of a TOML file."""
        self.problem(text, line_of(self.lines, path))

    def assume(self, what: str, value: str, why: str) -> None:
        """Note a value used because none was given."""
        self.assumptions.append(Assumption(what, value, why))


def capped(problems: list[Problem]) -> list[Problem]:
    """Problems of one file in order of line, at most `MOST_PROBLEMS` and a count of the rest."""
    ordered = sorted(problems, key=lambda problem: (problem.line or 0, problem.column or 0))
    if len(ordered) <= MOST_PROBLEMS:
        return ordered
    rest = len(ordered) - MOST_PROBLEMS
    more = f"and {rest} more problem{'s' if rest > 1 else ''} in this file; mend these first"
    return [*ordered[:MOST_PROBLEMS], Problem(ordered[0].file, more)]


def read_text(path: Path, file: str, inputs: list[InputFile]) -> str:
    """Read a text file of bounded size and note its hash in `inputs`.

    Parameters
    ----------
    path : Path
    file : str
        Its name in messages.
    inputs : list of InputFile
        Appended to.

    Raises
    ------
    InputError
        If the file is missing, too large or not text.
    """
    data = _read_bytes(path, file)
    inputs.append(InputFile(file, hashlib.sha256(data).hexdigest()))
    return decode(data, file)


def _read_bytes(path: Path, file: str) -> bytes:
    """Bytes of a file of bounded size."""
    try:
        if path.is_dir():
            raise InputError([Problem(file, "is a folder, a file is needed")])
        if not path.is_file():
            raise InputError([Problem(file, "there is no such file")])
        size = path.stat().st_size
        if size > LARGEST_FILE:
            text = f"has {size / 1e6:.1f} MB, more than the {LARGEST_FILE / 1e6:.0f} MB read; is it the right file?"
            raise InputError([Problem(file, text)])
        return path.read_bytes()
    except (OSError, ValueError) as error:
        reason = (error.strerror if isinstance(error, OSError) else None) or "its name cannot be used"
        raise InputError([Problem(file, f"cannot be opened: {reason}")]) from None


def decode(data: bytes, file: str) -> str:
    r"""Text of a file in UTF-8 (with or without mark), UTF-16 with mark, else Latin-1 as Windows writes it.

    Raises
    ------
    InputError
        If the bytes are no text, such as a workbook.

    Examples
    --------
    >>> decode("flow [m³/h]\r\n".encode("latin-1"), "curve.csv")
    'flow [m³/h]\n'
    """
    if data.startswith(_UTF16_MARKS):
        text = data.decode("utf-16", errors="replace")
    elif b"\x00" in data:
        raise InputError([Problem(file, "is not a text file; save it as text or CSV in UTF-8")])
    else:
        text = _decode_bytes(data)
    return text.replace("\r\n", "\n").replace("\r", "\n")


def _decode_bytes(data: bytes) -> str:
    """UTF-8, else Windows' form of Latin-1, else Latin-1 itself, which never fails."""
    for encoding in ("utf-8-sig", "cp1252"):
        try:
            return data.decode(encoding)
        except UnicodeDecodeError:
            continue
    return data.decode("latin-1")

"""Output on a terminal or pipe whose encoding lacks some characters: written in plain letters, never refused."""

import codecs
import io
from typing import TextIO

PLAIN = {
    "−": "-",
    "–": "-",
    "³": "3",
    "²": "2",
    "·": "*",
    "°": " deg ",
    "±": "+/-",
    "×": "x",
    "\u202f": " ",
    "η": "eta",
    "ρ": "rho",
    "ψ": "psi",
    "…": "...",
}
"""What stands in for a character; a minus sign above all must not get lost."""


def _in_plain_letters(error: UnicodeError) -> tuple[str, int]:
    """Handler of `codecs`: the part that cannot be encoded in plain letters, else a question mark."""
    if not isinstance(error, UnicodeEncodeError):
        raise error
    return "".join(PLAIN.get(letter, "?") for letter in error.object[error.start : error.end]), error.end


codecs.register_error("bidcheck-plain", _in_plain_letters)


def keep_readable(stream: TextIO) -> None:
    """Let a stream write in plain letters what its encoding lacks.

    Examples
    --------
    >>> "−0.5 m at 520 m³/h".encode("ascii", errors="bidcheck-plain")
    b'-0.5 m at 520 m3/h'
    """
    if isinstance(stream, io.TextIOWrapper):
        stream.reconfigure(errors="bidcheck-plain")

"""Text of files and of their names made harmless for a terminal."""

import re

_CONTROL = re.compile("[\x00-\x09\x0b-\x1f\x7f-\x9f\u200e\u200f\u2028-\u202e\u2066-\u2069\ud800-\udfff]")
"""Control characters but the line end, marks that turn the direction of writing, and halves of characters."""


def plain(text: str) -> str:
    r"""Text with every control character but the line end replaced, one for one.

    Examples
    --------
    >>> plain("alder\x1b[31m\ta")
    'alder�[31m a'
    """
    return _CONTROL.sub(lambda match: " " if match[0] == "\t" else "\N{REPLACEMENT CHARACTER}", text)


def one_line(text: str) -> str:
    r"""`plain` text without line ends.

    Examples
    --------
    >>> one_line("two\nlines")
    'two lines'
    """
    return " ".join(plain(text).splitlines())

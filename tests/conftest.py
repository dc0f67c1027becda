"""Files kept under review: compared with what the program makes of them now, rewritten with one flag."""

from collections.abc import Callable
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[1]
FLAG = "--update-golden"


def pytest_addoption(parser: pytest.Parser) -> None:
    """Add the flag."""
    parser.addoption(FLAG, action="store_true", help="rewrite files kept under review instead of comparing with them")


@pytest.fixture
def golden(request: pytest.FixtureRequest) -> Callable[[str, str], None]:
    """Compare `golden(path, text)`: a file named from the root of the repository, and what it should hold."""
    update = bool(request.config.getoption(FLAG))

    def compare(path: str, text: str) -> None:
        file = ROOT / path
        if update:
            file.write_text(text, encoding="utf-8", newline="\n")
            return
        stored = file.read_text(encoding="utf-8") if file.exists() else None
        if stored != text:
            what = "is not there" if stored is None else f"is out of date from line {_first_difference(stored, text)}"
            pytest.fail(f"{path} {what}; rewrite it with `pytest {FLAG}` and review the difference", pytrace=False)

    return compare


def _first_difference(stored: str, text: str) -> int:
    """Number of the first line that differs."""
    old, new = stored.split("\n"), text.split("\n")
    same = next((n for n, (a, b) in enumerate(zip(old, new, strict=False)) if a != b), min(len(old), len(new)))
    return same + 1

"""Texts kept in the repository and compared with what the program makes today."""

from difflib import unified_diff
from pathlib import Path

import pytest

ROOT = Path(__file__).parent.parent
FLAG = "--update-golden"


def hold_against(path: Path, text: str, *, update: bool) -> None:
    """Fail unless the file holds exactly `text`; with `update` write it instead."""
    if update:
        path.parent.mkdir(parents=True, exist_ok=True)
        path.write_text(text, encoding="utf-8", newline="\n")
        return
    name = path.relative_to(ROOT) if path.is_relative_to(ROOT) else path
    how = f"if the change is meant, run pytest {FLAG} and review the difference"
    if not path.exists():
        pytest.fail(f"{name} does not exist; {how}", pytrace=False)
    kept = path.read_bytes().decode("utf-8")
    if kept != text:
        lines = unified_diff(
            kept.splitlines(), text.splitlines(), f"{name} as kept", f"{name} as made now", lineterm=""
        )
        pytest.fail(f"{name} differs; {how}\n" + "\n".join(list(lines)[:60]), pytrace=False)

"""Run the program as a user does, in a process of its own."""

import os
import subprocess
import sys
from pathlib import Path

from tests.build import EXAMPLES

__all__ = ["EXAMPLES", "run"]


def run(*arguments: str | Path, cwd: Path | None = None) -> "subprocess.CompletedProcess[str]":
    """Run `bidcheck` with arguments; output as text, width 120, no colour."""
    environment = os.environ | {"COLUMNS": "120", "NO_COLOR": "1", "PYTHONIOENCODING": "utf-8"}
    return subprocess.run(
        [sys.executable, "-m", "bidcheck", *map(str, arguments)],
        capture_output=True,
        text=True,
        encoding="utf-8",
        env=environment,
        cwd=cwd or EXAMPLES.parent,
        check=False,
    )

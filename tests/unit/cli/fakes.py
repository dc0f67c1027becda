"""Commands run in this process on invented evaluations: no files read, no checks run."""

import importlib
from pathlib import Path
from types import SimpleNamespace
from typing import Any

from click.testing import CliRunner, Result

from bidcheck.cli import main
from bidcheck.quantity import UnitSystem


def finding(verdict: str, accepted: str | None = None, decisive: bool = False) -> SimpleNamespace:
    return SimpleNamespace(verdict=verdict, accepted=accepted, decisive=decisive)


def evaluation(*findings: SimpleNamespace, units: UnitSystem = UnitSystem.SI) -> SimpleNamespace:
    return SimpleNamespace(inquiry=SimpleNamespace(units=units), bids=(SimpleNamespace(findings=findings),))


class Fakes:
    """What stands in for reading, evaluating and reporting. `read` maps a folder to an evaluation or an error."""

    def __init__(self, monkeypatch: Any) -> None:
        self.read: dict[str, Any] = {}
        self.skipped: list[bool] = []
        self.systems: list[UnitSystem] = []
        replace = {
            "bidcheck.read.read_inquiry": self._read_inquiry,
            "bidcheck.line.evaluate": lambda inquiry: inquiry,
            "bidcheck.report.terminal.print_evaluation": self._print,
            "bidcheck.report.json_text.evaluation_json": lambda _evaluation: '{"η": 1}\n',
            "bidcheck.report.page.evaluation_page": lambda _evaluation, system: f"<p>{system}</p>\n",
        }
        for name, fake in replace.items():
            module, _, function = name.rpartition(".")
            monkeypatch.setattr(importlib.import_module(module), function, fake)

    def _read_inquiry(self, folder: Path, skip_unreadable: bool = False) -> Any:
        self.skipped.append(skip_unreadable)
        found = self.read.get(str(folder), evaluation())
        if isinstance(found, BaseException):
            raise found
        return found

    def _print(self, _evaluation: Any, console: Any, system: UnitSystem) -> None:
        self.systems.append(system)
        console.print("the table")


def invoke(*arguments: str | Path) -> Result:
    """Run `bidcheck` with arguments; exit code, output and errors apart."""
    return CliRunner().invoke(main, [str(argument) for argument in arguments], prog_name="bidcheck")

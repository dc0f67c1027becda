"""Names every source compared with at the end of a run of this folder."""

from pathlib import Path

import pytest

from tests.published.sources import sources_of_tests

HERE = Path(__file__).parent


def pytest_terminal_summary(terminalreporter: pytest.TerminalReporter) -> None:
    """List each source once with the number of comparisons that passed, where this folder alone was run."""
    passed: dict[str, int] = {}
    known: dict[str, dict[str, str]] = {}
    for report in terminalreporter.stats.get("passed", []):
        if report.when != "call" or "::" not in report.nodeid:
            continue
        file, _, name = report.nodeid.partition("::")
        path = HERE.parents[1] / file
        if HERE not in path.parents:
            return
        if file not in known:
            known[file] = sources_of_tests(path.read_text(encoding="utf-8"))
        source = known[file].get(name.split("[")[0].split("::")[-1])
        if source:
            passed[source] = passed.get(source, 0) + 1
    if passed:
        terminalreporter.section("sources compared with")
        for source, count in sorted(passed.items()):
            terminalreporter.write_line(f"{count:4}  {source}")

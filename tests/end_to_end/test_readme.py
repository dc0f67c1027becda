"""README's commands are whole, and what it and the guide show is what the program prints."""

import re
from pathlib import Path

import pytest

from tests.end_to_end.command import run

README = Path(__file__).parents[2] / "README.md"
SHOWN = re.compile(
    r"(<!-- output: bidcheck (?P<arguments>[^\n]+) -->\n```\n)(?P<output>.*?)(```\n<!-- end of output -->)", re.S
)


def with_output(text: str) -> str:
    """A document with the output of each command it names put between its markers."""

    def shown_anew(match: re.Match[str]) -> str:
        done = run(*match["arguments"].split(), cwd=README.parent)
        assert done.returncode == 0, done.stderr
        return match[1] + done.stdout + match[4]

    assert SHOWN.search(text) is not None, "the markers of the output are lost"
    return SHOWN.sub(shown_anew, text)


@pytest.mark.parametrize("document", ["README.md", "docs/guide.md"])
def test_output_is_current(golden, document):
    golden(document, with_output((README.parent / document).read_text(encoding="utf-8")))


def test_output_shows_every_example_bid():
    match = SHOWN.search(README.read_text(encoding="utf-8"))
    assert match is not None
    assert all(name in match["output"] for name in ("alder", "birch", "cedar", "dogwood", "elm"))


def test_each_command_stands_on_one_line():
    blocks = re.findall(r"^```\n(python3 .*?)^```$", README.read_text(encoding="utf-8"), re.S | re.M)
    assert len(blocks) == 2
    for block, end in zip(
        blocks, ("bidcheck evaluate example_bids/cooling_water\n", "python -m pytest -q\n"), strict=True
    ):
        assert block.count("\n") == 1
        assert block.endswith(end)
        assert block.startswith("python3 -m venv .venv && .venv/bin/pip install -q ")


def test_every_file_it_points_to_is_there():
    for target in re.findall(r"\]\(([^)]+)\)", README.read_text(encoding="utf-8")):
        assert (README.parent / target).exists(), target

"""Pages made from the code, help texts and shown outputs are those of today's program."""

import re
import tomllib

import pytest
from click.testing import CliRunner

from bidcheck.cli import COMMANDS, main
from bidcheck.read.limit_sets import LIMIT_SETS, limit_set
from bidcheck.report.reference import checks_page, methods_page
from tests.end_to_end.command import run
from tests.golden_files import ROOT, hold_against
from tests.shown_output import MARK, with_output

PAGES = ("README.md", "docs/guide.md")


def test_checks_page(golden):
    golden("docs/checks.md", checks_page(tuple(limit_set(name) for name in LIMIT_SETS)))


def test_methods_page(golden):
    golden("docs/methods.md", methods_page())


@pytest.mark.parametrize("name", ["", *COMMANDS])
def test_help(golden, name):
    arguments = [name, "--help"] if name else ["--help"]
    shown = CliRunner().invoke(main, arguments, prog_name="bidcheck", terminal_width=100)
    golden(f"help/{name or 'bidcheck'}.txt", shown.stdout)


def printed(arguments: list[str]) -> str:
    """What the program prints into a pipe."""
    done = run(*arguments)
    assert done.returncode == 0, done.stderr
    return done.stdout


@pytest.mark.parametrize("page", PAGES)
def test_shown_output_is_what_the_program_prints(page, update_golden):
    text = (ROOT / page).read_text(encoding="utf-8")
    assert MARK in text
    hold_against(ROOT / page, with_output(text, printed), update=update_golden)


@pytest.mark.parametrize(
    "page", ["README.md", "DEVELOPERS.md", "example_bids/README.md", "docs/guide.md", "docs/files.md"]
)
def test_links_lead_somewhere(page):
    path = ROOT / page
    links = re.findall(r"\]\((?!https?:)([^)#\s]+)", path.read_text(encoding="utf-8"))
    assert [link for link in links if not (path.parent / link).exists()] == []


def test_paths_named_for_developers_exist():
    text = (ROOT / "DEVELOPERS.md").read_text(encoding="utf-8")
    named = re.findall(r"`((?:bidcheck|tests|docs|example_bids|\.ci)/[\w./-]*)`", text)
    assert len(named) > 40
    assert [name for name in named if "NAME" not in name and not (ROOT / name).exists()] == []


def test_every_part_of_the_package_is_named_for_developers():
    text = (ROOT / "DEVELOPERS.md").read_text(encoding="utf-8")
    folders = [path.parent.name for path in (ROOT / "bidcheck").glob("*/__init__.py")]
    assert [name for name in folders if f"`bidcheck/{name}/`" not in text] == []


def test_every_dependency_has_its_reason():
    project = tomllib.loads((ROOT / "pyproject.toml").read_text(encoding="utf-8"))["project"]
    table = (ROOT / "DEVELOPERS.md").read_text(encoding="utf-8").split("## Dependencies")[1]
    wanted = [*project["dependencies"], *project["optional-dependencies"]["test"]]
    assert [name for name in (re.split(r"[><=\[]", one)[0] for one in wanted) if name not in table] == []


def test_nothing_else_stands_at_the_top():
    allowed = {"pyproject.toml", "README.md", "DEVELOPERS.md", "LICENSE", "bidcheck", "tests", "example_bids", "docs"}
    made = {"report", "evaluation.json", "dist", "build", "venv"}  # by hand, in following the guide or packing
    found = {
        path.name for path in ROOT.iterdir() if not path.name.startswith(".") and not path.name.endswith("egg-info")
    }
    assert found - made == allowed

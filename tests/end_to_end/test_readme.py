"""The two commands of README stand on one line each, are what CI runs, and its Python examples run."""

import re
import subprocess
import sys

import pytest

from tests.golden_files import ROOT
from tests.shown_output import arguments, command_named


@pytest.fixture
def readme():
    return (ROOT / "README.md").read_text(encoding="utf-8")


def test_main_job_installs_and_evaluates_an_example(readme):
    line = command_named(readme, "main job")
    assert "pip install" in line
    command, folder = arguments(line)
    assert command == "evaluate"
    assert (ROOT / folder / "inquiry.toml").is_file()


def test_the_output_shown_is_that_of_the_main_job(readme):
    line = command_named(readme, "main job")
    assert f"```bash\n{line}\n```\n\n<!-- output of the command above -->\n\n```text\n" in readme


def test_tests_are_installed_and_run(readme):
    line = command_named(readme, "tests")
    assert "'.[test]'" in line
    assert line.endswith("-m pytest -q")


def test_ci_takes_its_command_from_readme(readme):
    script = (ROOT / ".ci" / "run").read_text(encoding="utf-8")
    assert "README.md" in script
    assert "pytest -q" not in script.replace("pytest -q -rs tests/browser", "")
    found = re.search(r"^tests_command=\$\((.*)\)$", script, re.MULTILINE)
    assert found is not None
    done = subprocess.run(["bash", "-c", found[1]], capture_output=True, text=True, cwd=ROOT, check=True)
    assert done.stdout.strip() == command_named(readme, "tests")


def test_python_examples_run(readme):
    examples = re.findall(r"```python\n(.*?)```\n", readme, re.DOTALL)
    assert examples
    for example in examples:
        done = subprocess.run([sys.executable, "-c", example], capture_output=True, text=True, cwd=ROOT, check=False)
        assert done.returncode == 0, done.stderr

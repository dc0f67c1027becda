"""What goes where in a process of its own: colours, pipes that close, encodings that lack characters."""

import os
import subprocess
import sys

import pytest

from tests.end_to_end.command import EXAMPLES

COOLING = EXAMPLES / "cooling_water"


def run_bytes(*arguments: str, **environment: str) -> "subprocess.CompletedProcess[bytes]":
    kept = {name: value for name, value in os.environ.items() if name not in ("COLUMNS", "NO_COLOR", "FORCE_COLOR")}
    command = [sys.executable, "-m", "bidcheck", *arguments]
    return subprocess.run(command, capture_output=True, env=kept | environment, cwd=EXAMPLES.parent, check=False)


def test_a_pipe_gets_no_colours():
    assert b"\x1b" not in run_bytes("evaluate", str(COOLING)).stdout


def test_no_color_is_respected_where_colours_are_forced():
    forced = run_bytes("evaluate", str(COOLING), FORCE_COLOR="1")
    assert b"\x1b[" in forced.stdout
    plain = run_bytes("evaluate", str(COOLING), FORCE_COLOR="1", NO_COLOR="1")
    assert b"\x1b[31m" not in plain.stdout
    assert b"\x1b[33m" not in plain.stdout


def test_no_progress_and_no_errors_in_a_pipe():
    assert run_bytes("evaluate", str(COOLING), str(EXAMPLES / "boiler_feed")).stderr == b""


@pytest.mark.parametrize("encoding", ["ascii", "cp1252", "latin-1"])
def test_an_encoding_that_lacks_characters_keeps_the_minus_sign(encoding):
    done = run_bytes("evaluate", str(COOLING), PYTHONIOENCODING=encoding)
    assert done.returncode == 0, done.stderr
    assert b"-0.5 m" in done.stdout


def test_json_is_utf8_whatever_the_encoding():
    usual = run_bytes("evaluate", str(COOLING), "--json", "-", PYTHONIOENCODING="utf-8")
    narrow = run_bytes("evaluate", str(COOLING), "--json", "-", PYTHONIOENCODING="ascii")
    assert narrow.stdout == usual.stdout


@pytest.mark.parametrize(("option", "code"), [([], 0), (["--fail-on", "fail"], 3), (["--json", "-"], 0)])
def test_a_reader_that_goes_away_is_met_in_silence_and_keeps_the_exit_code(option, code):
    reading, writing = os.pipe()
    os.close(reading)
    try:
        command = [sys.executable, "-m", "bidcheck", "evaluate", str(COOLING), *option]
        done = subprocess.run(command, stdout=writing, stderr=subprocess.PIPE, check=False, cwd=EXAMPLES.parent)
    finally:
        os.close(writing)
    assert done.stderr == b""
    assert done.returncode == code

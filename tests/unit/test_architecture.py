"""Imports point downwards, only `read` opens inputs, only `cli` writes files, each library stays where it belongs."""

from pathlib import Path

import pytest

import bidcheck
from tests.architecture import sources, violations

PACKAGE = Path(bidcheck.__file__).parent


def test_the_package_keeps_to_the_arrows():
    assert violations(sources(PACKAGE)) == []


def test_every_file_is_looked_at():
    assert len(sources(PACKAGE)) == len(list(PACKAGE.rglob("*.py"))) > 60


@pytest.mark.parametrize(
    ("module", "source"),
    [
        ("bidcheck.hydraulics.new", "from bidcheck.bid import Bid"),
        ("bidcheck.estimates.new", "from bidcheck.inquiry import Inquiry"),
        ("bidcheck.checks.new", "from bidcheck.report.format import figure"),
        ("bidcheck.checks.new", "import bidcheck.report.format"),
        ("bidcheck.checks.new", "from bidcheck import report"),
        ("bidcheck.checks.new", "def run():\n    from bidcheck.report.format import figure"),
        ("bidcheck.read.new", "from bidcheck.report import words"),
        ("bidcheck.report.new", "from bidcheck.read import read_inquiry"),
        ("bidcheck.line", "from bidcheck.cli import main"),
        ("bidcheck.fit.new", "from bidcheck.estimates import window"),
        ("bidcheck.quantity", "from bidcheck.curve import Curve"),
        ("bidcheck.checks.new", "from .request import COMMON"),
        ("bidcheck.utils", "from bidcheck.errors import BidcheckError"),
        ("bidcheck.report.new", "import click"),
        ("bidcheck.read.new", "from pint import UnitRegistry"),
        ("bidcheck.fit.new", "import pandas as pd"),
        ("bidcheck.line", "from rich.console import Console"),
        ("bidcheck.checks.new", "import matplotlib.pyplot as plt"),
        ("bidcheck.report.new", "from datetime import date"),
        ("bidcheck.report.new", "import os"),
        ("bidcheck.money.new", "import random"),
        ("bidcheck.money.new", "import numpy as np\nnp.random.default_rng()"),
        ("bidcheck.money.new", "import numpy as np\nnp.random.normal(0.0, 1.0)"),
        ("bidcheck.report.new", "open('page.html')"),
        ("bidcheck.checks.new", "path.read_text()"),
        ("bidcheck.report.new", "path.write_text('')"),
        ("bidcheck.read.new", "path.write_bytes(b'')"),
        ("bidcheck.record.new", "folder.mkdir()"),
    ],
)
def test_a_planted_violation_is_found(module, source):
    assert len(violations({module: source})) == 1


@pytest.mark.parametrize(
    ("module", "source"),
    [
        ("bidcheck.checks.new", "from bidcheck.hydraulics import suction"),
        ("bidcheck.checks.new", "from bidcheck.checks.request import COMMON"),
        ("bidcheck.line", "from bidcheck import __version__"),
        ("bidcheck.read.new", "path.read_bytes()"),
        ("bidcheck.cli.new", "import os\nimport click\npath.write_text('')"),
        ("bidcheck.report.new", "files('bidcheck.report').joinpath(name).read_text('utf-8')"),
        ("bidcheck.money.new", "import numpy as np\nnp.random.default_rng(seed)"),
    ],
)
def test_what_is_allowed_passes(module, source):
    assert violations({module: source}) == []

"""docs/validation.md tells what the code does now: the verdicts of its first pumps are judged again."""

import re

import pytest

from tests.benchmarks.peers_study import peers_study
from tests.benchmarks.validation_page import published_rows
from tests.benchmarks.validation_study import FINGERPRINTED, POPULATIONS, SEED, TABLED, fingerprint, judged
from tests.golden_files import ROOT

PAGE = (ROOT / "docs" / "validation.md").read_text(encoding="utf-8")


@pytest.mark.parametrize("population", POPULATIONS)
def test_the_page_is_current(population):
    written = re.search(rf"{population} `([0-9a-f]+)`", PAGE)
    assert written is not None
    found = fingerprint(judged(population, FINGERPRINTED, TABLED))
    assert found == written[1], "rebuild the page: python -m tests.benchmarks.validation_study"


def test_published_figures_of_the_page_agree():
    for _, published, computed, source in published_rows():
        near = 0.8 if "pixel" in source else 0.011
        assert abs(float(published.split()[0]) - float(computed.split()[0])) <= near


def test_the_figure_of_the_page_exists():
    (name,) = re.findall(r"!\[.*\]\((.*)\)", PAGE)
    assert (ROOT / "docs" / name).read_text(encoding="utf-8").startswith("<?xml")


def test_honest_bids_are_seldom_called_ahead_of_the_others():
    found = {one.bids: one for one in peers_study(SEED)}
    assert all(one.honest <= 0.07 for one in found.values())
    assert all(one.eight >= 0.70 and one.ten >= 0.88 for one in found.values())

"""Another order of points, another order of files, another basis of print: the same verdicts."""

import random
import re
import shutil
from pathlib import Path

import pytest

import bidcheck
from bidcheck import Verdict
from tests.build import EXAMPLES
from tests.rewrite_units import rewrite_in_us_units


def verdicts(folder: Path) -> dict[tuple[str, str, str], Verdict]:
    """Verdict of every finding by bidder, check and subject, line numbers left out."""
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(folder))
    return {
        (bid.case.bid.bidder, finding.check, re.sub(r":\d+", "", finding.subject)): finding.verdict
        for bid in evaluation.bids
        for finding in bid.findings
    }


def shuffled(path: Path, rng: random.Random) -> None:
    """Put the rows of figures of a curve file in another order."""
    lines = path.read_text(encoding="utf-8").splitlines()
    rows = [i for i, line in enumerate(lines) if re.match(r"\s*\d", line)]
    order = rows.copy()
    rng.shuffle(order)
    mixed = lines.copy()
    for old, new in zip(rows, order, strict=True):
        mixed[new] = lines[old]
    path.write_text("\n".join(mixed) + "\n", encoding="utf-8")


@pytest.mark.parametrize("folder", ["cooling_water", "boiler_feed"])
@pytest.mark.parametrize("seed", [1, 2, 3])
def test_the_order_of_points_does_not_matter(tmp_path, folder, seed):
    target = tmp_path / folder
    shutil.copytree(EXAMPLES / folder, target)
    rng = random.Random(seed)
    for path in sorted(target.rglob("*.csv")):
        shuffled(path, rng)
    assert verdicts(target) == verdicts(EXAMPLES / folder)


@pytest.mark.parametrize("folder", ["cooling_water", "boiler_feed"])
@pytest.mark.parametrize("digits", [6, None])
def test_the_units_do_not_matter(tmp_path, folder, digits):
    rewrite_in_us_units(EXAMPLES / folder, tmp_path / "us", digits=digits)
    assert verdicts(tmp_path / "us") == verdicts(EXAMPLES / folder)


BETWEEN_BIDS = ("efficiency-peers", "same-hydraulics")


def test_the_other_bids_matter_only_where_bids_are_compared(tmp_path):
    everything = verdicts(EXAMPLES / "cooling_water")
    for name in ("alder", "elm"):
        target = tmp_path / name
        shutil.copytree(EXAMPLES / "cooling_water", target)
        for other in (target / "bids").iterdir():
            if other.name != name:
                shutil.rmtree(other)
        alone = {key: verdict for key, verdict in verdicts(target).items() if key[1] not in BETWEEN_BIDS}
        assert alone == {
            key: verdict for key, verdict in everything.items() if key[0] == name and key[1] not in BETWEEN_BIDS
        }

"""How often honest bids are asked about, and how often overstated ones are found. Rebuilds docs/validation.md:

python -m tests.benchmarks.validation_study
"""

import hashlib
from collections import defaultdict
from collections.abc import Iterable
from dataclasses import dataclass
from pathlib import Path

from bidcheck.checks import efficiency_ceiling, efficiency_claim, efficiency_shape
from bidcheck.checks.runner import run_checks
from bidcheck.finding import Verdict
from bidcheck.prepare import prepare
from tests.benchmarks.validation_pumps import Population, Pump, overstated, pumps

SEED = 20261201
COUNT = 1800
"""Pumps of each population."""
RAISED = (0.0, 2.0, 3.0, 4.0, 5.0, 6.0, 8.0, 10.0, 12.0)
"""Points by which best efficiency is overstated."""
TABLED = (0.0, 3.0, 5.0, 8.0, 10.0)
POPULATIONS: tuple[Population, ...] = ("market", "median", "table")
CHECKS = (efficiency_claim.CHECK, efficiency_ceiling.CHECK, efficiency_shape.CHECK)
FINGERPRINTED = 45
"""Pumps of each population whose verdicts are hashed, so that a test can tell whether the page is current."""
SIZES = ((6.0, 18.0), (18.0, 65.0), (65.0, 250.0), (250.0, 1000.0), (1000.0, 5000.0))
SPEEDS = ((12.0, 20.0), (20.0, 35.0), (35.0, 50.0), (50.0, 70.0))


@dataclass(frozen=True, slots=True)
class Judged:
    """One pump and the gravest verdict of the efficiency checks by points of overstatement."""

    population: Population
    pump: Pump
    verdicts: dict[float, Verdict]
    low: bool
    """Whether the honest bid is asked about because its efficiency is very low."""

    def asked(self, points: float) -> bool:
        """Whether a question or worse came of it."""
        return self.verdicts[points] in (Verdict.QUERY, Verdict.FAIL)


def judge(pump: Pump, points: float) -> tuple[Verdict, bool]:
    """Gravest verdict of the efficiency checks on the pump overstated so far, and whether it is called very low."""
    inquiry = overstated(pump, points)
    order = list(Verdict)
    everything = run_checks(prepare(inquiry, inquiry.bids[0]), CHECKS)
    found = [finding for finding in everything if finding.verdict is not Verdict.NOT_APPLICABLE] or list(everything)
    low = any(
        finding.verdict is Verdict.QUERY and finding.limit is not None and finding.limit.name == "efficiency_very_low"
        for finding in found
    )
    return max((finding.verdict for finding in found), key=order.index), low


def _judged(population: Population, pump: Pump, steps: tuple[float, ...]) -> Judged:
    """One pump at every step."""
    found = {points: judge(pump, points) for points in steps}
    return Judged(population, pump, {points: verdict for points, (verdict, _) in found.items()}, found[0.0][1])


def judged(population: Population, count: int, raised: Iterable[float] = RAISED) -> list[Judged]:
    """Judge the pumps of a population, each overstated by every number of points."""
    steps = tuple(raised)
    return [_judged(population, pump, steps) for pump in pumps(population, count, SEED)]


def fingerprint(rows: Iterable[Judged]) -> str:
    """Hash of the verdicts at the overstatements tabled."""
    text = "\n".join(" ".join(row.verdicts[points].value for points in TABLED) for row in rows)
    return hashlib.sha256(text.encode()).hexdigest()[:16]


def shares(rows: list[Judged]) -> list[str]:
    """Number of pumps, and the share asked about at each overstatement tabled, in per cent."""
    cells = [f"{100 * sum(row.asked(points) for row in rows) / len(rows):.1f}" for points in TABLED]
    cells[0] = f"{cells[0]} ({sum(row.asked(0.0) for row in rows)})"
    return [str(len(rows)), *cells]


def grouped(rows: list[Judged]) -> dict[str, dict[str, list[Judged]]]:
    """Rows by class, by size and by specific speed."""
    groups: dict[str, dict[str, list[Judged]]] = {
        "class": defaultdict(list),
        "size": defaultdict(list),
        "specific speed per eye": defaultdict(list),
    }
    for row in rows:
        groups["class"][row.pump.kind.name].append(row)
    for low, high in SIZES:
        inside = [row for row in rows if low <= row.pump.flow_m3h < high]
        groups["size"][f"{low:g} to {high:g} m³/h"] = inside
    for low, high in SPEEDS:
        inside = [row for row in rows if low <= row.pump.nq_eye < high]
        groups["specific speed per eye"][f"nq {low:g} to {high:g}"] = inside
    return {name: {key: found for key, found in group.items() if found} for name, group in groups.items()}


def single_stage(rows: Iterable[Judged]) -> list[Judged]:
    """Single-stage pumps from 65 to 3300 m³/h."""
    return [row for row in rows if row.pump.kind.stages == 1 and 65.0 <= row.pump.flow_m3h <= 3300.0]


def main() -> None:
    """Run the study and write the page and its figure."""
    from tests.benchmarks.validation_page import write_page

    found = {population: judged(population, COUNT) for population in POPULATIONS}
    write_page(found, Path(__file__).parents[2] / "docs")


if __name__ == "__main__":
    main()

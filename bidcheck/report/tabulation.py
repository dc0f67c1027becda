"""The tabulation: items down, bidders across, what the inquiry requires beside them, deviations marked."""

from collections.abc import Callable
from dataclasses import dataclass

from bidcheck.checks.npsh_margin import margins
from bidcheck.evaluation import BidEvaluation, Evaluation
from bidcheck.finding import Verdict
from bidcheck.limits import Limit, Limits
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.format import NOTHING, figure, plain
from bidcheck.report.words import OUTCOME_WORDS, limit_in_words

DEVIATIONS = (Verdict.FAIL, Verdict.QUERY)


@dataclass(frozen=True, slots=True)
class Row:
    """One item: what is required, each bidder's figure, and whether it deviates."""

    item: str
    required: str
    values: list[str]
    marked: list[bool]


@dataclass(frozen=True, slots=True)
class Tabulation:
    """Bidders with revision across, rows down."""

    bidders: list[str]
    rows: list[Row]


Value = Callable[[BidEvaluation], "float | str | None"]


def least_margin(bid: BidEvaluation) -> tuple[float, float] | None:
    """Least NPSH margin over the flows asked for, and the flow where it occurs [m, m³/s]; None where unknown."""
    known = [(at.npsh_margin, at.flow) for _, at in bid.case.operating if at.npsh_margin is not None]
    return min(known) if known else None


def tabulation(evaluation: Evaluation, system: UnitSystem) -> Tabulation:
    """Tabulate an evaluation in the units asked for."""
    rows = [_row(evaluation, system, item) for item in _items(evaluation, system)]
    return Tabulation([plain(bid.case.bid.name) for bid in evaluation.bids], rows)


def _row(evaluation: Evaluation, system: UnitSystem, item: "Item") -> Row:
    """One item over all bids; marked where one of its checks queries or fails."""
    name, kind, value, required, checks = item
    values, marked = [], []
    for bid in evaluation.bids:
        values.append(figure(value(bid), kind, system))
        marked.append(
            any(
                finding.verdict in DEVIATIONS and (finding.check, finding.subject) in checks for finding in bid.findings
            )
        )
    return Row(name, required, values, marked)


Item = tuple[str, Kind, Value, str, tuple[tuple[str, str], ...]]


def _items(evaluation: Evaluation, system: UnitSystem) -> list[Item]:
    """The items of the tabulation in the order of the job."""
    return [*_offer(), *_duty(evaluation, system), *_efficiency(evaluation, system), *_suction(evaluation, system)]


def _offer() -> list[Item]:
    return [
        ("outcome", Kind.TEXT, lambda b: OUTCOME_WORDS[b.outcome], "", ()),
        ("model", Kind.TEXT, lambda b: b.case.bid.model or None, "", ()),
        ("arrangement", Kind.TEXT, lambda b: b.case.bid.arrangement, "", ()),
        ("stages", Kind.COUNT, lambda b: float(b.case.bid.stages), "", ()),
        ("speed", Kind.SPEED, lambda b: b.case.bid.speed_rpm, "", ()),
        ("impeller, rated", Kind.DIAMETER, lambda b: b.case.bid.impeller_rated, "", ()),
        ("impeller, maximum", Kind.DIAMETER, lambda b: b.case.bid.impeller_max, "", ()),
    ]


def _duty(evaluation: Evaluation, system: UnitSystem) -> list[Item]:
    duty, limits = evaluation.inquiry.duty, evaluation.inquiry.limits
    return [
        (
            "head at rated flow",
            Kind.HEAD,
            lambda b: b.case.at_duty.head,
            figure(duty.rated_head, Kind.HEAD, system),
            (("duty-head", "rated"),),
        ),
        (
            "best efficiency flow",
            Kind.FLOW,
            lambda b: b.case.pumped.bep.flow if b.case.pumped and b.case.pumped.bep else None,
            "",
            (("declared-bep", "flow"),),
        ),
        (
            "rated flow over best efficiency flow",
            Kind.WHOLE_SHARE,
            lambda b: b.case.at_duty.flow_over_bep,
            _words(limits.rated_over_bep, system),
            (("bep-match", "rated"),),
        ),
        (
            "minimum continuous flow",
            Kind.FLOW,
            lambda b: b.case.bid.claims.min_continuous_flow.value if b.case.bid.claims.min_continuous_flow else None,
            "" if duty.min_flow is None else f"at most {figure(duty.min_flow, Kind.FLOW, system)}",
            (("flow-range", "smallest flow"),),
        ),
    ]


def _efficiency(evaluation: Evaluation, system: UnitSystem) -> list[Item]:
    limits = evaluation.inquiry.limits
    claim = (("efficiency-claim", "best efficiency"), ("efficiency-ceiling", "best efficiency"))
    balance = (("power-balance", "all points"), ("rated-on-curve", "power at rated flow"))
    return [
        ("best efficiency, offered", Kind.SHARE, lambda b: b.case.estimates.offered_efficiency, "", claim),
        ("best efficiency, expected", Kind.SHARE, lambda b: _estimate(b, "expected"), "", ()),
        ("best efficiency, attainable", Kind.SHARE, lambda b: _estimate(b, "attainable"), "", ()),
        ("efficiency at rated flow", Kind.SHARE, lambda b: b.case.at_duty.efficiency, "", ()),
        ("shaft power at rated flow", Kind.POWER, lambda b: b.case.at_duty.power, "", balance),
        ("driver rating", Kind.POWER, lambda b: b.case.bid.driver.rating, "", ()),
        ("specific speed, total flow", Kind.SPECIFIC_SPEED, lambda b: b.case.estimates.nq, "", ()),
        (
            "head coefficient over that expected",
            Kind.RATIO,
            lambda b: b.case.estimates.impeller.ratio if b.case.estimates.impeller else None,
            _words(limits.head_coefficient, system),
            (("head-coefficient", "best efficiency"),),
        ),
        (
            "tip speed",
            Kind.TIP_SPEED,
            lambda b: b.case.estimates.impeller.tip_speed if b.case.estimates.impeller else None,
            "",
            (("tip-speed", "impeller"),),
        ),
    ]


def _suction(evaluation: Evaluation, system: UnitSystem) -> list[Item]:
    limits = evaluation.inquiry.limits
    both = (("npsh-margin", "rated"), ("npsh-margin", "largest flow"))
    return [
        ("NPSH3 at rated flow", Kind.NPSH, lambda b: b.case.at_duty.npsh3, "", (("npsh-claim", "best efficiency"),)),
        (
            "least NPSH margin",
            Kind.TEXT,
            lambda b: margin_in_words(b, system),
            _margin_wanted(limits, system),
            both,
        ),
        (
            "suction specific speed",
            Kind.SUCTION_SPECIFIC_SPEED,
            lambda b: b.case.estimates.nss,
            _words(limits.suction_specific_speed, system),
            (("suction-specific-speed", "best efficiency"),),
        ),
        ("price", Kind.TEXT, price_in_words, "", ()),
        ("delivery", Kind.TEXT, lambda b: b.case.bid.commercial.delivery, "", ()),
    ]


def price_in_words(bid: BidEvaluation) -> str | None:
    """Price with its currency, adders not included."""
    commercial = bid.case.bid.commercial
    if commercial.price is None:
        return None
    return f"{figure(commercial.price, Kind.MONEY, UnitSystem.SI)} {commercial.currency}".rstrip()


def margin_in_words(bid: BidEvaluation, system: UnitSystem) -> str:
    """Least NPSH margin and where: "1.6 m at 520 m³/h"."""
    least = least_margin(bid)
    if least is None:
        return NOTHING
    return f"{figure(least[0], Kind.NPSH, system)} at {figure(least[1], Kind.FLOW, system)}"


def _estimate(bid: BidEvaluation, name: str) -> float | None:
    """A figure of the independent estimate."""
    estimate = bid.case.estimates.efficiency
    value: float | None = getattr(estimate, name) if estimate is not None else None
    return value


def _margin_wanted(limits: Limits, system: UnitSystem) -> str:
    """The ordinary margin, and the raised one with the suction specific speed above which it is wanted."""
    words = _words(limits.npsh_margin, system)
    raised, ordinary = margins(limits, raised=True)[0].at_least, limits.nss_ordinary.at_most
    if raised is None or ordinary is None or raised == limits.npsh_margin.at_least:
        return words
    high = figure(ordinary, Kind.SUCTION_SPECIFIC_SPEED, system)
    return f"{words}; {figure(raised, Kind.NPSH, system)} above suction specific speed {high}"


def _words(limit: Limit, system: UnitSystem) -> str:
    return limit_in_words(limit, system)

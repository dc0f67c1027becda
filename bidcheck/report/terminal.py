"""The evaluation on a terminal: one table of bidders against what matters, then what stands against each bid."""

from collections.abc import Sequence

from rich.console import Console
from rich.table import Table
from rich.text import Text

from bidcheck.evaluation import BidEvaluation, Evaluation, Outcome
from bidcheck.finding import Finding, Verdict
from bidcheck.inquiry import Inquiry
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.format import figure, plain, tied
from bidcheck.report.tabulation import margin_in_words
from bidcheck.report.words import (
    CAUTION,
    HOW_SHARP,
    OUTCOME_WORDS,
    VERDICT_WORDS,
    against,
    counted,
    limit_in_words,
    message,
    question,
)

CHECK_WIDTH = 24
"""Room for the longest name of a check and a blank."""

HIDE = str.maketrans({"\u00a0": "\ue000", "\u202f": "\ue001"})
SHOW = str.maketrans({"\ue000": " ", "\ue001": "\u202f"})
"""Spaces at which no line may break, out of sight of the wrapping and back."""

STYLES = {
    Verdict.FAIL: "bold red",
    Verdict.QUERY: "bold yellow",
    Verdict.NO_DATA: "bold cyan",
    Verdict.REMARK: "bold",
    Outcome.NOT_ACCEPTABLE: "red",
    Outcome.ACCEPTABLE_AFTER_QUERIES: "yellow",
    Outcome.INCOMPLETE: "cyan",
    Outcome.ACCEPTABLE: "green",
}


def print_evaluation(evaluation: Evaluation, console: Console, system: UnitSystem) -> None:
    """Print an evaluation.

    Parameters
    ----------
    evaluation : Evaluation
    console : rich Console
        Its width is used; text from bidders can neither colour nor move it.
    system : UnitSystem
        Units to print.
    """
    console.print(_headline(evaluation.inquiry, system))
    console.print()
    print_trimmed(_table(evaluation, system), console)
    for bid in evaluation.bids:
        console.print()
        _print_bid(bid, console, system)
    _print_left_out(evaluation.inquiry, console)
    console.print()
    if any(finding.check == "efficiency-claim" for bid in evaluation.bids for finding in against(bid.findings)):
        _print_prose(HOW_SHARP, console)
    _print_prose(CAUTION, console)


def print_trimmed(table: Table, console: Console) -> None:
    """A table without blanks at the end of its lines."""
    for segments in console.render_lines(table, pad=False):
        line = Text.assemble(*((segment.text, segment.style or "") for segment in segments))
        line.rstrip()
        console.print(line, soft_wrap=True)


def _print_prose(words: str, console: Console) -> None:
    """A paragraph, wrapped without trailing blanks."""
    for line in Text(words, style="dim").wrap(console, console.width):
        line.rstrip()
        console.print(line, soft_wrap=True)


def _headline(inquiry: Inquiry, system: UnitSystem) -> Text:
    """Tag, title, duty, NPSH available and the set of limits."""
    duty = inquiry.duty
    npsha = "not given" if duty.npsha is None else figure(duty.npsha, Kind.NPSH, system)
    if inquiry.suction is not None:
        npsha = "from suction data"
    line = Text(plain(f"{inquiry.tag}  {inquiry.title}".strip()), style="bold")
    line.append(
        f"\nduty {figure(duty.rated_flow, Kind.FLOW, system)} at {figure(duty.rated_head, Kind.HEAD, system)}"
        f" · NPSH available {npsha} · limits: {inquiry.limits.set_name}",
        style="not bold",
    )
    return line


def _table(evaluation: Evaluation, system: UnitSystem) -> Table:
    """Bidders down, what matters across."""
    table = Table(box=None, pad_edge=False, padding=(0, 2, 0, 0), header_style="bold")
    table.add_column("bid", no_wrap=True)
    table.add_column("outcome")
    for heading in ("rated/BEP", "best efficiency", "expected", "least NPSH margin", "shaft power"):
        table.add_column(heading, justify="right")
    for bid in evaluation.bids:
        case = bid.case
        estimate = case.estimates.efficiency
        table.add_row(
            Text(plain(case.bid.name)),
            Text(_outcome(bid), style=STYLES[bid.outcome]),
            figure(case.at_duty.flow_over_bep, Kind.WHOLE_SHARE, system),
            figure(case.estimates.offered_efficiency, Kind.SHARE, system),
            figure(estimate.expected if estimate is not None else None, Kind.SHARE, system),
            margin_in_words(bid, system),
            figure(case.at_duty.power, Kind.POWER, system),
        )
    return table


def _outcome(bid: BidEvaluation) -> str:
    """Outcome in words, with the accepted deviations."""
    accepted = bid.accepted_deviations
    if not accepted:
        return OUTCOME_WORDS[bid.outcome]
    return f"{OUTCOME_WORDS[bid.outcome]}, with {accepted} accepted deviation{'s' if accepted > 1 else ''}"


def _print_bid(bid: BidEvaluation, console: Console, system: UnitSystem) -> None:
    """What stands against one bid, the gravest first, then what passed in one line."""
    head = Text(plain(bid.case.bid.name), style="bold")
    head.append(f"  {_outcome(bid)}", style=STYLES[bid.outcome])
    console.print(head)
    asked: set[str] = set()
    findings = against(bid.findings)
    wanting = _wanting(findings, system)
    for finding in findings:
        others = wanting.get(message(finding, system), [finding.check])
        if finding.verdict is not Verdict.NO_DATA or others[0] == finding.check:
            also = [name for name in others if name != finding.check]
            _print_finding(finding, console, system, asked, also=also)
    counts = counted(bid.findings)
    rest = f"  {counts[Verdict.PASS]} passed"
    if counts[Verdict.NOT_APPLICABLE]:
        rest += f", {counts[Verdict.NOT_APPLICABLE]} not applicable"
    console.print(Text(rest, style="dim"))


def _wanting(findings: Sequence[Finding], system: UnitSystem) -> dict[str, list[str]]:
    """Checks that could not be made for want of the same thing, each once, by what is said of it."""
    found: dict[str, list[str]] = {}
    for finding in findings:
        if finding.verdict is Verdict.NO_DATA:
            names = found.setdefault(message(finding, system), [])
            if finding.check not in names:
                names.append(finding.check)
    return found


def _print_finding(
    finding: Finding, console: Console, system: UnitSystem, asked: set[str], *, also: Sequence[str] = ()
) -> None:
    """Verdict and check at the left, the words beside them, wrapped without trailing blanks."""
    lead = Text("  ")
    lead.append(f"{VERDICT_WORDS[finding.verdict]:<8}", style=STYLES[finding.verdict])
    lead.append(f"{finding.check:<{CHECK_WIDTH}}")
    words = _said(finding, system, asked)
    if also and finding.verdict is Verdict.NO_DATA:
        words.append(f"\nfor want of it not checked either: {', '.join(also)}")
    words.plain = tied(words.plain).translate(HIDE)
    for number, line in enumerate(words.wrap(console, max(console.width - len(lead), 30))):
        line.rstrip()
        line.plain = line.plain.translate(SHOW)
        console.print((lead if number == 0 else Text(" " * len(lead))) + line, soft_wrap=True)


def _said(finding: Finding, system: UnitSystem, asked: set[str]) -> Text:
    """Message, limit with origin, question; a question already asked of this bid is not repeated."""
    text = Text(message(finding, system))
    if finding.accepted is not None:
        text.append(f"\naccepted: {plain(finding.accepted)}")
    if finding.limit is not None and finding.verdict is not Verdict.NO_DATA:
        text.append(f"\nlimit: {limit_in_words(finding.limit, system)} ({finding.limit.origin})", style="dim")
    ask = question(finding, system)
    if ask and ask not in asked:
        asked.add(ask)
        text.append("\nask: ", style="bold")
        text.append(ask)
    return text


def _print_left_out(inquiry: Inquiry, console: Console) -> None:
    """Bids that could not be read and were left out on request."""
    for bid in inquiry.unreadable:
        console.print()
        console.print(Text(f"{plain(bid.bidder)}  left out: could not be read", style="bold red"))
        for problem in bid.problems:
            console.print(Text("  " + plain(str(problem))))

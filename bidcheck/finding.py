"""What a check measures, and the finding that becomes of it."""

from collections.abc import Callable, Iterable, Mapping
from dataclasses import dataclass, field
from enum import StrEnum
from typing import TYPE_CHECKING

from bidcheck.limits import Comparison, Limit
from bidcheck.quantity import Kind

if TYPE_CHECKING:
    from bidcheck.case import Case


class Verdict(StrEnum):
    """What a finding says, from nothing to say to what stands against the bid."""

    PASS = "pass"
    NOT_APPLICABLE = "not-applicable"
    NO_DATA = "no-data"
    REMARK = "remark"
    QUERY = "query"
    FAIL = "fail"


@dataclass(frozen=True, slots=True)
class Evidence:
    """A figure behind a finding: SI value (fraction for shares), or text, and what kind it is."""

    value: float | str
    kind: Kind


@dataclass(frozen=True, slots=True, kw_only=True)
class Measured:
    """One comparison of one check.

    A check gives either `holds` (the verdict follows: pass, else fail where the limit is mandatory, else the check's
    own), or `verdict` outright where it has steps. `wording` picks one of the check's wordings.
    """

    subject: str
    evidence: Mapping[str, Evidence] = field(default_factory=dict)
    holds: Comparison | None = None
    verdict: Verdict | None = None
    limit: Limit | None = None
    wording: str = ""
    decisive: bool = False


@dataclass(frozen=True, slots=True)
class Wording:
    """Message and question of one outcome of a check, as templates over the names of its evidence.

    `{limit}` stands for the limit in words. An empty question asks nothing.
    """

    message: str
    question: str = ""


@dataclass(frozen=True, slots=True, kw_only=True)
class Check:
    """The record of one check. `wordings[""]` is used where a comparison names none."""

    name: str
    group: str
    run: "Callable[[Case], Iterable[Measured]]"
    otherwise: Verdict
    source: str
    wordings: Mapping[str, Wording]
    limits: tuple[str, ...] = ()
    """Names of the limits it uses, of the register in `bidcheck.limits`."""


@dataclass(frozen=True, slots=True, kw_only=True)
class Finding:
    """The result of one comparison of one check for one bid. (check, subject) is unique per bid.

    Message and question stay templates: `report` fills them in the units asked for.
    """

    check: str
    group: str
    subject: str
    verdict: Verdict
    wording: Wording
    evidence: Mapping[str, Evidence]
    limit: Limit | None
    source: str
    decisive: bool = False
    """Whether missing data here holds the bid up."""
    accepted: str | None = None
    """Reason for accepting it in spite of its verdict; None where nobody has."""

"""Evaluate centrifugal-pump bids for one duty: fit, check, compare with independent estimates, record.

The public names are listed in `__all__`; they are loaded on first use, so that `import bidcheck` stays light.
"""

from importlib import import_module
from typing import TYPE_CHECKING, Any

__version__ = "0.1.0"

_PLACES = {
    "read_inquiry": "bidcheck.read",
    "evaluate": "bidcheck.line",
    "Inquiry": "bidcheck.inquiry",
    "Bid": "bidcheck.bid",
    "Evaluation": "bidcheck.evaluation",
    "Finding": "bidcheck.finding",
    "Verdict": "bidcheck.finding",
    "Outcome": "bidcheck.evaluation",
    "BidcheckError": "bidcheck.errors",
    "InputError": "bidcheck.errors",
    "UnitError": "bidcheck.errors",
    "NotSupplied": "bidcheck.errors",
    "OutOfRange": "bidcheck.errors",
}

__all__ = [
    "Bid",
    "BidcheckError",
    "Evaluation",
    "Finding",
    "InputError",
    "Inquiry",
    "NotSupplied",
    "OutOfRange",
    "Outcome",
    "UnitError",
    "Verdict",
    "__version__",
    "evaluate",
    "read_inquiry",
]

if TYPE_CHECKING:
    from bidcheck.bid import Bid
    from bidcheck.errors import BidcheckError, InputError, NotSupplied, OutOfRange, UnitError
    from bidcheck.evaluation import Evaluation, Outcome
    from bidcheck.finding import Finding, Verdict
    from bidcheck.inquiry import Inquiry
    from bidcheck.line import evaluate
    from bidcheck.read import read_inquiry


def __getattr__(name: str) -> Any:
    if name in _PLACES:
        return getattr(import_module(_PLACES[name]), name)
    raise AttributeError(f"module 'bidcheck' has no attribute {name!r}")


def __dir__() -> list[str]:
    return sorted(__all__)

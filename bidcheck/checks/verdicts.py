"""What a missed limit comes to."""

from bidcheck.finding import Verdict
from bidcheck.limits import Limit


def missed(limit: Limit, otherwise: Verdict) -> Verdict:
    """Verdict of a missed limit: fail where it is mandatory, else the limit's own, else the check's.

    Examples
    --------
    >>> from bidcheck.quantity import Kind
    >>> limit = Limit("shutoff_droop", Kind.SHARE, None, 0.01, "specification 4.2", "purchaser", mandatory=True)
    >>> missed(limit, Verdict.REMARK)
    <Verdict.FAIL: 'fail'>
    """
    if limit.mandatory:
        return Verdict.FAIL
    return Verdict(limit.missed) if limit.missed is not None else otherwise

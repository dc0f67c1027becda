"""What is known only from memory or as common practice never makes a bid unacceptable by itself."""

import pytest

from bidcheck.read.limit_sets import LIMIT_SETS, limit_set


@pytest.mark.parametrize("name", LIMIT_SETS)
def test_a_mandatory_limit_rests_on_more_than_memory_or_practice(name):
    mandatory = [limit for limit in limit_set(name).all() if limit.mandatory]
    assert mandatory
    assert [limit.name for limit in mandatory if limit.mark in ("memory", "practice")] == []

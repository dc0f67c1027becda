import pytest

from bidcheck.errors import InputError
from bidcheck.limits import limit_names
from bidcheck.quantity import Kind
from bidcheck.read.limit_sets import LIMIT_SETS, limit_set, limits_with


@pytest.mark.parametrize("name", LIMIT_SETS)
def test_shipped_sets_are_complete_and_carry_their_origin(name):
    limits = limit_set(name)
    assert limits.set_name == name
    assert [limit.name for limit in limits.all()] == list(limit_names())
    assert all(limit.origin and limit.mark for limit in limits.all())


def test_values_are_si():
    limits = limit_set("general-water")
    assert limits.rated_over_bep.at_least == 0.8
    assert limits.nss_ordinary.at_most == pytest.approx(7500 / 51.645, rel=1e-4)
    assert limits.suction_specific_speed.missed == "remark"
    assert limits.curve_points.at_least == 5


def test_unknown_set():
    with pytest.raises(InputError, match='there is no set "proces"; nearest is "process"'):
        limit_set("proces")


def test_override_replaces_whole_and_belongs_to_the_purchaser():
    base = limit_set("general-water")
    own = {"at_least": "3 ft", "origin": "spec 4.3", "mandatory": True}
    limit = limits_with(base, {"npsh_margin": own}).npsh_margin
    assert (limit.at_least, limit.at_most) == (pytest.approx(0.9144), None)
    assert (limit.origin, limit.mark, limit.mandatory, limit.kind) == ("spec 4.3", "purchaser", True, Kind.NPSH)
    floor = limits_with(base, {"npsh_floor": {"at_least": "0.1 m", "origin": "spec"}}).npsh_floor
    assert not floor.mandatory
    assert limits_with(base, {}) == base


@pytest.mark.parametrize(
    ("name", "limit", "message"),
    [
        ("npsh_margn", {"at_least": "1 m", "origin": "x"}, 'npsh_margn: is not known; nearest is "npsh_margin"'),
        ("npsh_margin", {"at_least": "1 m"}, "npsh_margin: origin is missing"),
        ("npsh_margin", {"origin": "x"}, "npsh_margin: has neither at_least nor at_most"),
        ("npsh_margin", "1 m", 'npsh_margin: is not a limit; write npsh_margin = { at_least = "1.0 m", origin ='),
        ("npsh_margin", {"at_least": 1, "origin": "x"}, 'at_least: found "1", which has no unit; write "1 m"'),
        ("npsh_margin", {"at_least": "2 m", "at_most": "1 m", "origin": "x"}, "at_least is above at_most"),
        ("rated_over_bep", {"at_most": 110, "origin": "x"}, 'write "110 %" or "1.1"'),
        ("npsh_margin", {"at_least": "1 m", "origin": "x", "mark": "text"}, "mark: is not known"),
        ("npsh_margin", {"at_least": "1 m", "origin": "x", "mandatory": "yes"}, "write mandatory = true"),
    ],
)
def test_override_refused(name, limit, message):
    with pytest.raises(InputError) as caught:
        limits_with(limit_set("process"), {name: limit})
    assert message in str(caught.value)


def test_a_limit_from_the_wrong_side_is_refused():
    own = {"npsh_margin": {"at_most": "1.0 m", "origin": "spec"}, "odd_point": {"at_least": "1 %", "origin": "spec"}}
    with pytest.raises(InputError) as error:
        limits_with(limit_set("process"), own)
    assert len(error.value.problems) == 2
    assert "write at_least" in str(error.value)
    assert "write at_most" in str(error.value)

import re
from dataclasses import replace
from itertools import pairwise
from xml.etree import ElementTree

import pytest

import bidcheck
from bidcheck.bid import Claims
from bidcheck.curve import Fits
from bidcheck.evaluation import Evaluation
from bidcheck.quantity import UnitSystem
from bidcheck.report.drawing import LOOKS, spread
from bidcheck.report.figures import curve_figure, efficiency_figure, head_figure, npsh_figure, without
from bidcheck.report.overlays import available, highest_npsh3, margins_wanted
from bidcheck.report.window_map import off_the_map, window_figure
from tests.build import EXAMPLES, inquiry, points, sound_bid, sound_curve

CURVES = [head_figure, efficiency_figure, npsh_figure]
FIGURES = [*CURVES, window_figure]


def evaluated(*bids, **changes) -> Evaluation:
    return bidcheck.evaluate(inquiry(bids=bids or (sound_bid(),), **changes))


@pytest.fixture(scope="module")
def example() -> Evaluation:
    return bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))


def texts(svg: str) -> list[str]:
    return ["".join(one.itertext()).strip() for one in ElementTree.fromstring(svg).iter() if one.tag.endswith("text")]


@pytest.mark.parametrize("draw", FIGURES)
@pytest.mark.parametrize("system", list(UnitSystem))
def test_a_figure_is_the_same_bytes_each_time_and_well_formed(example, draw, system):
    svg = draw(example, system)
    assert svg == draw(example, system)
    assert ElementTree.fromstring(svg).attrib["role"] == "img"
    assert ElementTree.fromstring(svg).attrib["aria-label"]
    assert svg.startswith("<svg")
    assert "<!DOCTYPE" not in svg


def test_the_ids_of_the_figures_never_meet(example):
    ids = [one for draw in FIGURES for one in re.findall(r'\bid="([^"]+)"', draw(example, UnitSystem.SI))]
    assert len(ids) == len(set(ids))


@pytest.mark.parametrize("draw", FIGURES)
def test_every_reference_inside_a_figure_has_its_target(example, draw):
    svg = draw(example, UnitSystem.SI)
    ids = set(re.findall(r'\bid="([^"]+)"', svg))
    assert set(re.findall(r'href="#([^"]+)"|url\(#([^)]+)\)', svg))
    assert {a or b for a, b in re.findall(r'href="#([^"]+)"|url\(#([^)]+)\)', svg)} <= ids


@pytest.mark.parametrize(
    ("draw", "si", "us"),
    [
        (head_figure, "head [m]", "head [ft]"),
        (efficiency_figure, "efficiency [%]", "efficiency [%]"),
        (npsh_figure, "NPSH [m]", "NPSH [ft]"),
    ],
)
def test_axes_name_their_units(example, draw, si, us):
    assert {"flow [m³/h]", si} <= set(texts(draw(example, UnitSystem.SI)))
    assert {"flow [US gpm]", us} <= set(texts(draw(example, UnitSystem.US)))


@pytest.mark.parametrize("draw", CURVES)
def test_every_bid_with_the_curve_is_named_at_it(example, draw):
    found = texts(draw(example, UnitSystem.SI))
    column = {head_figure: "head", efficiency_figure: "efficiency", npsh_figure: "npsh3"}[draw]
    absent = without(example, column)
    for bid in example.bids:
        assert (bid.case.bid.name in found) is (bid.case.bid.name not in absent)


def test_an_odd_point_is_named_with_the_value_that_would_fit():
    q = [0, 80, 160, 240, 320, 400, 440, 480, 520, 580]
    head = [round(74.0 + 0.002 * x - 6.2e-5 * x**2, 1) for x in q]
    head[4] -= 9.0
    evaluation = evaluated(sound_bid(curves=(sound_curve(head=points(q, head)),)))
    assert evaluation.bids[0].case.fits.odd_points
    assert any(text.startswith("odd point") for text in texts(head_figure(evaluation, UnitSystem.SI)))
    assert not any(text.startswith("odd point") for text in texts(head_figure(evaluated(), UnitSystem.SI)))


@pytest.mark.parametrize("draw", FIGURES)
def test_a_bid_without_curves_is_left_out_and_named(draw):
    evaluation = evaluated(sound_bid(), sound_bid(bidder="cedar", curves=(), claims=Claims()))
    assert "cedar a" not in texts(draw(evaluation, UnitSystem.SI))
    assert without(evaluation, "head") == without(evaluation, "npsh3") == ["cedar a"]


@pytest.mark.parametrize("draw", CURVES)
def test_no_bid_at_all_still_draws_axes(draw):
    evaluation = bidcheck.evaluate(inquiry(bids=()))
    assert "flow [m³/h]" in texts(draw(evaluation, UnitSystem.SI))


def test_the_duty_is_inside_the_picture_even_beyond_every_curve():
    base = inquiry()
    far = replace(base.duty, rated_flow=900 / 3600.0, rated_head=120.0, max_flow=950 / 3600.0)
    assert any(text.startswith("duty") for text in texts(head_figure(evaluated(duty=far), UnitSystem.SI)))
    from bidcheck.report import figures

    axes = figures.drawn_head(evaluated(duty=far), UnitSystem.SI).axes[0]
    assert axes.get_xlim()[1] >= 950
    assert axes.get_ylim()[1] >= 120


def test_nothing_is_drawn_beyond_a_bidders_points():
    from bidcheck.report import figures

    axes = figures.drawn_head(evaluated(), UnitSystem.SI).axes[0]
    curve = max(axes.lines, key=lambda line: len(line.get_xdata()))
    assert max(curve.get_xdata()) == pytest.approx(580)
    assert min(curve.get_xdata()) == pytest.approx(0)


def test_the_margin_required_is_drawn_below_what_is_available():
    found = texts(npsh_figure(evaluated(), UnitSystem.SI))
    assert any("available" in text for text in found)
    assert any("less margin" in text for text in found)


def test_bidder_text_cannot_become_markup_or_mathematics():
    svg = head_figure(evaluated(sound_bid(bidder="<b>$x^2$&")), UnitSystem.SI)
    assert "<b>$x^2$& a" in texts(svg)


def test_looks_differ_in_line_and_in_marker():
    assert len({look.line for look in LOOKS}) == len({look.marker for look in LOOKS}) == len(LOOKS)


@pytest.mark.parametrize("wanted", [[], [1.0], [1.0, 1.0, 1.0], [5.0, 1.0, 1.4, 1.5, 9.0]])
def test_labels_keep_their_gap_and_their_order(wanted):
    places = spread(wanted, 1.0)
    order = sorted(range(len(wanted)), key=lambda k: wanted[k])
    gaps = [places[b] - places[a] for a, b in pairwise(order)]
    assert all(gap >= 1.0 - 1e-9 for gap in gaps)


def test_one_curve_without_efficiency_draws_head_alone():
    case = evaluated(sound_bid(curves=(sound_curve(efficiency=None, power=None),))).bids[0].case
    assert isinstance(case.fits, Fits)
    found = texts(curve_figure(case.fits, case.curve, UnitSystem.US))
    assert "head [ft]" in found
    assert "efficiency [%]" not in found


@pytest.mark.parametrize(
    ("npsha", "raised", "highest"),
    [
        (6.8, False, 6.8 / 1.10),  # ratio governs: 0.618 m > 0.6 m
        (6.0, False, 6.0 - 0.6),  # difference governs: 0.6 m > 0.545 m
        (6.8, True, 6.8 / 1.20),
        (5.0, True, 5.0 - 1.0),
    ],
)
def test_the_stricter_of_difference_and_ratio_governs_the_margin(npsha, raised, highest):
    base = inquiry().limits
    least = {"npsh_margin": 0.6, "npsh_ratio": 1.10, "npsh_margin_raised": 1.0, "npsh_ratio_raised": 1.20}
    limits = replace(base, **{name: replace(getattr(base, name), at_least=value) for name, value in least.items()})
    assert highest_npsh3(npsha, limits, raised) == pytest.approx(highest)


def test_the_raised_margin_is_drawn_where_a_bid_is_held_against_it():
    base = inquiry().limits
    ordinary = replace(base, nss_ordinary=replace(base.nss_ordinary, at_most=1000.0))
    always = replace(base, nss_ordinary=replace(base.nss_ordinary, at_most=1.0))
    assert margins_wanted(evaluated(limits=ordinary)) == [False]
    assert margins_wanted(evaluated(limits=always)) == [True]
    assert margins_wanted(evaluated(sound_bid(curves=(), claims=Claims()), limits=always)) == [False]


def test_npsh_available_is_known_only_where_the_inquiry_gives_it():
    base = inquiry().duty
    assert [npsha for _, npsha in available(evaluated())] == [6.8, 6.3]
    assert [npsha for _, npsha in available(evaluated(duty=replace(base, npsha_at_max_flow=None)))] == [6.8]
    nothing = evaluated(duty=replace(base, npsha=None, npsha_at_max_flow=None))
    assert available(nothing) == []
    assert "available" not in texts(npsh_figure(nothing, UnitSystem.SI))


def test_every_bid_stands_on_the_map_of_specific_speed(example):
    svg = window_figure(example, UnitSystem.SI)
    words = texts(svg)
    assert {bid.case.bid.name for bid in example.bids} <= set(words)
    assert {"best efficiency flow [m³/h]", "specific speed, total flow nq", "500", "20"} <= set(words)
    assert off_the_map(example) == []
    us = texts(window_figure(example, UnitSystem.US))
    assert {"best efficiency flow [US gpm]", "specific speed, total flow [US]", "1000"} <= set(us)


def test_a_bid_without_a_best_efficiency_is_named_beneath_the_map():
    bare = sound_bid(bidder="birch", curves=(sound_curve(efficiency=None, power=None),), claims=Claims())
    evaluation = evaluated(sound_bid(), bare)
    assert off_the_map(evaluation) == ["birch a"]
    assert "birch a" not in texts(window_figure(evaluation, UnitSystem.SI))
    assert window_figure(evaluated(bare), UnitSystem.SI) == ""

"""What must hold for every curve: other units, other order of columns, honest scatter."""

from dataclasses import replace

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from bidcheck.curve import COLUMNS, Points
from bidcheck.fit import fit_curve, fit_points, odd_points
from tests.synthetic_curves import honest_curve, mistyped


def rescaled(points: Points, flow: float, value: float) -> Points:
    return Points(
        points.flow * flow,
        points.value * value,
        points.flow_half_digit * flow,
        points.value_half_digit * value,
        points.line,
    )


@settings(max_examples=60, deadline=None, derandomize=True)
@given(seed=st.integers(0, 10_000), flow=st.floats(1e-3, 1e3), value=st.floats(1e-3, 1e3))
def test_another_unit_gives_the_same_fit(seed, flow, value):
    curve = honest_curve(np.random.default_rng(seed)).curve
    for column in COLUMNS:
        points = curve.points(column)
        here, there = fit_points(points, column), fit_points(rescaled(points, flow, value), column)
        assert here.degree == there.degree
        middle = float(points.flow.mean())
        assert there.at(middle * flow) == pytest.approx(here.at(middle) * value, rel=1e-9)
        assert there.half_width(middle * flow) == pytest.approx(here.half_width(middle) * value, rel=1e-6)


@settings(max_examples=60, deadline=None, derandomize=True)
@given(seed=st.integers(0, 10_000))
def test_every_fit_is_defined_on_its_points_only_and_leaves_freedom(seed):
    curve = honest_curve(np.random.default_rng(seed)).curve
    fits = fit_curve(curve)
    for column in COLUMNS:
        fit, points = fits.of(column), curve.points(column)
        assert fit.degree <= len(points) - 2
        assert np.isfinite(fit.t95)
        assert fit.covariance.shape == (fit.degree + 1, fit.degree + 1)
        assert (np.linalg.eigvalsh(fit.covariance) >= -1e-12 * np.abs(fit.covariance).max()).all()
    if fits.bep is not None:
        assert fits.efficiency.covers(fits.bep.flow)
        grid = np.linspace(*fits.efficiency.domain, 400)
        assert fits.bep.efficiency >= fits.efficiency.polynomial(grid).max() - 1e-12
        assert fits.bep.flow_interval[0] <= fits.bep.flow <= fits.bep.flow_interval[1]


def test_points_in_another_liquid_density_change_no_stated_column():
    curve = honest_curve(np.random.default_rng(7)).curve
    here, there = fit_curve(curve), fit_curve(replace(curve, density=700.0))
    assert here.power.at(0.5 * here.power.domain[1]) == there.power.at(0.5 * there.power.domain[1])


@pytest.mark.parametrize("noise", [0.0, None])
def test_fewer_than_one_honest_curve_in_a_hundred_is_accused(noise):
    rng = np.random.default_rng(20)
    accused = sum(bool(fit_curve(honest_curve(rng, noise).curve).odd_points) for _ in range(400))
    assert accused < 4


@pytest.mark.parametrize(("factor", "floor"), [(1.05, 0.60), (1.10, 0.85)])
def test_mistyped_inner_heads_are_caught(factor, floor):
    rng = np.random.default_rng(21)
    caught, wrong = 0, 0
    for _ in range(200):
        head = honest_curve(rng, n=int(rng.integers(9, 15))).curve.head
        index = int(rng.integers(1, len(head) - 1))
        odd, _ = odd_points(mistyped(head, index, factor), "head")
        lines = {point.line for point in odd}
        caught += int(head.line[index]) in lines
        wrong += bool(lines - {int(head.line[index])})
    assert caught >= floor * 200
    assert wrong <= 4


def test_interval_of_best_efficiency_flow_holds_the_true_one_in_nine_cases_of_ten():
    rng = np.random.default_rng(22)
    inside, widths = [], []
    for _ in range(300):
        synthetic = honest_curve(rng)
        bep = fit_curve(synthetic.curve).bep
        if bep is not None and synthetic.shape != 0:
            inside.append(bep.flow_interval[0] <= synthetic.best_flow <= bep.flow_interval[1])
            widths.append((bep.flow_interval[1] - bep.flow_interval[0]) / synthetic.best_flow)
    assert np.mean(inside) >= 0.92
    assert np.median(widths) < 0.08

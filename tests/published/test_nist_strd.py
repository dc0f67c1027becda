"""The least-squares solver on the NIST Statistical Reference Datasets for linear regression.

Accuracy is counted in correct digits, -log10 of the relative error, of the worst coefficient (15 is as printed).
Coefficients in scaled x are taken to powers of x in exact arithmetic, so that only the solver's own error counts.
Reached: Wampler1 10.2, Wampler2 13.3, Wampler3 9.6, Wampler4 9.9, Wampler5 7.8, Longley 11.5, Filip 13.9 (as printed
in the sources: 15 digits); the floors asserted leave about one digit and a half to another processor.
"""

from fractions import Fraction
from math import comb, log10

import numpy as np
import pytest

from bidcheck.fit import solve
from bidcheck.fit.candidates import scaled_flow

# source: NIST StRD, Wampler1 to Wampler5 (Wampler, JASA 65 (1970) 549-565): x = 0 ... 20, y of Wampler1 the sum of
# x^0 ... x^5, of Wampler2 the sum of (x/10)^0 ... (x/10)^5, of the others that of Wampler1 plus 1, 100, 10000 times:
DISTURBANCE = [
    759, -2048, 2048, -2048, 2523, -2048, 2048, -2048, 1838, -2048, 2048,
    -2048, 1838, -2048, 2048, -2048, 2523, -2048, 2048, -2048, 759,
]  # fmt: skip
# source: NIST StRD, Wampler3, certified standard deviations of the estimates (Wampler4 and 5: 100 and 10000 times)
WAMPLER3_ERRORS = [2152.32624678170, 2363.55173469681, 779.343524331583, 101.475507550350, 5.64566512170752, 0.112324854679312]  # fmt: skip # noqa: E501

# source: NIST StRD, Longley (JASA 62 (1967) 819-841): y, x1 ... x6
LONGLEY = np.array([
    [60323, 83.0, 234289, 2356, 1590, 107608, 1947], [61122, 88.5, 259426, 2325, 1456, 108632, 1948],
    [60171, 88.2, 258054, 3682, 1616, 109773, 1949], [61187, 89.5, 284599, 3351, 1650, 110929, 1950],
    [63221, 96.2, 328975, 2099, 3099, 112075, 1951], [63639, 98.1, 346999, 1932, 3594, 113270, 1952],
    [64989, 99.0, 365385, 1870, 3547, 115094, 1953], [63761, 100.0, 363112, 3578, 3350, 116219, 1954],
    [66019, 101.2, 397469, 2904, 3048, 117388, 1955], [67857, 104.6, 419180, 2822, 2857, 118734, 1956],
    [68169, 108.4, 442769, 2936, 2798, 120445, 1957], [66513, 110.8, 444546, 4681, 2637, 121950, 1958],
    [68655, 112.6, 482704, 3813, 2552, 123366, 1959], [69564, 114.2, 502601, 3931, 2514, 125368, 1960],
    [69331, 115.7, 518173, 4806, 2572, 127852, 1961], [70551, 116.9, 554894, 4007, 2827, 130081, 1962],
])  # fmt: skip
# source: NIST StRD, Longley, certified estimates and their standard deviations
LONGLEY_CERTIFIED = [
    -3482258.63459582, 15.0618722713733, -0.0358191792925910, -2.02022980381683, -1.03322686717359,
    -0.0511041056535807, 1829.15146461355,
]  # fmt: skip
LONGLEY_ERRORS = [
    890420.383607373, 84.9149257747669, 0.0334910077722432, 0.488399681651699, 0.214274163161675,
    0.226073200069370, 455.478499142212,
]  # fmt: skip

# source: NIST StRD, Filip (Filippelli): y, x
FILIP = np.array([
    0.8116, -6.860120914, 0.9072, -4.324130045, 0.9052, -4.358625055, 0.9039, -4.358426747, 0.8053, -6.955852379,
    0.8377, -6.661145254, 0.8667, -6.355462942, 0.8809, -6.118102026, 0.7975, -7.115148017, 0.8162, -6.815308569,
    0.8515, -6.519993057, 0.8766, -6.204119983, 0.8885, -5.853871964, 0.8859, -6.109523091, 0.8959, -5.79832982,
    0.8913, -5.482672118, 0.8959, -5.171791386, 0.8971, -4.851705903, 0.9021, -4.517126416, 0.909, -4.143573228,
    0.9139, -3.709075441, 0.9199, -3.499489089, 0.8692, -6.300769497, 0.8872, -5.953504836, 0.89, -5.642065153,
    0.891, -5.031376979, 0.8977, -4.680685696, 0.9035, -4.329846955, 0.9078, -3.928486195, 0.7675, -8.56735134,
    0.7705, -8.363211311, 0.7713, -8.107682739, 0.7736, -7.823908741, 0.7775, -7.522878745, 0.7841, -7.218819279,
    0.7971, -6.920818754, 0.8329, -6.628932138, 0.8641, -6.323946875, 0.8804, -5.991399828, 0.7668, -8.781464495,
    0.7633, -8.663140179, 0.7678, -8.473531488, 0.7697, -8.247337057, 0.77, -7.971428747, 0.7749, -7.676129393,
    0.7796, -7.352812702, 0.7897, -7.072065318, 0.8131, -6.774174009, 0.8498, -6.478861916, 0.8741, -6.159517513,
    0.8061, -6.835647144, 0.846, -6.53165267, 0.8751, -6.224098421, 0.8856, -5.910094889, 0.8919, -5.598599459,
    0.8934, -5.290645224, 0.894, -4.974284616, 0.8957, -4.64454848, 0.9047, -4.290560426, 0.9129, -3.885055584,
    0.9209, -3.408378962, 0.9219, -3.13200249, 0.7739, -8.726767166, 0.7681, -8.66695597, 0.7665, -8.511026475,
    0.7703, -8.165388579, 0.7702, -7.886056648, 0.7761, -7.588043762, 0.7809, -7.283412422, 0.7961, -6.995678626,
    0.8253, -6.691862621, 0.8602, -6.392544977, 0.8809, -6.067374056, 0.8301, -6.684029655, 0.8664, -6.378719832,
    0.8834, -6.065855188, 0.8898, -5.752272167, 0.8964, -5.132414673, 0.8963, -4.811352704, 0.9074, -4.098269308,
    0.9119, -3.66174277, 0.9228, -3.2644011,
]).reshape(-1, 2)  # fmt: skip
# source: NIST StRD, Filip, certified estimates
FILIP_CERTIFIED = [
    -1467.48961422980, -2772.17959193342, -2316.37108160893, -1127.97394098372, -354.478233703349, -75.1242017393757,
    -10.8753180355343, -1.06221498588947, -0.0670191154593408, -0.00246781078275479, -0.0000402962525080404,
]  # fmt: skip
# source: NIST StRD, Filip, certified residual standard deviation
FILIP_DEVIATION = 0.00334801051324544


def correct_digits(found, certified) -> float:
    """Digits of the worst figure, 15 at most."""
    worst = max(abs(Fraction(f) - Fraction(c)) / abs(Fraction(c)) for f, c in zip(found, certified, strict=True))
    return 15.0 if worst == 0 else min(15.0, -log10(worst))


def powers_of_x(scaled: np.ndarray, lo: float, hi: float) -> list[Fraction]:
    """Exact coefficients in x of a polynomial in u = (2x - lo - hi)/(hi - lo)."""
    slope = Fraction(2) / (Fraction(hi) - Fraction(lo))
    shift = -(Fraction(hi) + Fraction(lo)) / (Fraction(hi) - Fraction(lo))
    result = [Fraction(0)] * len(scaled)
    for k, c in enumerate(scaled.tolist()):
        for j in range(k + 1):
            result[j] += Fraction(c) * comb(k, j) * slope**j * shift ** (k - j)
    return result


def polynomial_digits(x: np.ndarray, y: np.ndarray, certified: list) -> float:
    """Correct digits of the polynomial fitted in scaled x."""
    lo, hi = float(x.min()), float(x.max())
    design = scaled_flow(x, (lo, hi))[:, None] ** np.arange(len(certified))
    return correct_digits(powers_of_x(solve(design, y).coefficients, lo, hi), certified)


X = np.arange(21.0)
SUM = sum(X**k for k in range(6))


# source: NIST StRD, Wampler1 to Wampler5, certified estimates
@pytest.mark.parametrize(
    ("y", "certified", "floor"),
    [
        pytest.param(SUM, [1] * 6, 8.5, id="Wampler1"),
        pytest.param(
            np.round(sum((X / 10) ** k for k in range(6)), 5),
            [Fraction(1, 10**k) for k in range(6)],
            12.0,
            id="Wampler2",
        ),
        pytest.param(SUM + np.array(DISTURBANCE), [1] * 6, 8.0, id="Wampler3"),
        pytest.param(SUM + 100.0 * np.array(DISTURBANCE), [1] * 6, 8.0, id="Wampler4"),
        pytest.param(SUM + 10000.0 * np.array(DISTURBANCE), [1] * 6, 6.0, id="Wampler5"),
    ],
)
def test_wampler(y, certified, floor):
    assert polynomial_digits(X, y, certified) >= floor


# source: NIST StRD, Wampler3 to 5, certified standard deviations of the estimates
def test_wampler_standard_errors_in_powers_of_x():
    solution = solve(X[:, None] ** np.arange(6), SUM + np.array(DISTURBANCE))
    assert correct_digits(solution.standard_errors, WAMPLER3_ERRORS) >= 12.0


# source: NIST StRD, Longley, certified estimates
def test_longley():
    design = np.column_stack([np.ones(len(LONGLEY)), LONGLEY[:, 1:]])
    solution = solve(design, LONGLEY[:, 0])
    assert correct_digits(solution.coefficients, LONGLEY_CERTIFIED) >= 10.0
    assert correct_digits(solution.standard_errors, LONGLEY_ERRORS) >= 10.5


# source: NIST StRD, Filip, certified estimates and residual standard deviation
def test_filip():
    x, y = FILIP[:, 1], FILIP[:, 0]
    assert len(x) == 82
    assert polynomial_digits(x, y, FILIP_CERTIFIED) >= 12.0
    design = scaled_flow(x, (float(x.min()), float(x.max())))[:, None] ** np.arange(11)
    assert correct_digits([solve(design, y).deviation], [FILIP_DEVIATION]) >= 13.0

"""Affinity laws against published examples."""

from bidcheck.hydraulics.affinity import flow_at_speed, head_at_speed, npsh3_at_speed, power_at_speed
from bidcheck.hydraulics.suction import npsh3_speed_exponent
from tests.published.printed import assert_as_printed


# source: published worked example of the affinity laws: 1700 rpm, 200 gpm, 60 ft, 5 bhp brought to 2000 rpm
def test_worked_example():
    assert_as_printed(flow_at_speed(200.0, 1700, 2000), "235")
    assert_as_printed(head_at_speed(60.0, 1700, 2000), "83")
    assert_as_printed(power_at_speed(5.0, 1700, 2000), "8.1")


# source: published guidance on NPSH3 at reduced speed: 14 ft at 3550 rpm is 4.8 ft at 1750 rpm with exponent 1.5
# source: and exponents of about 1 at half flow, 1.5 at best efficiency, 2 at 1.3 times it
def test_npsh3_at_reduced_speed():
    assert_as_printed(npsh3_at_speed(14.0, 3550, 1750, npsh3_speed_exponent(1.0)), "4.8")
    assert_as_printed(npsh3_speed_exponent(0.5), "1.0")
    assert_as_printed(npsh3_speed_exponent(1.0), "1.5")
    assert_as_printed(npsh3_speed_exponent(1.3), "2.0")

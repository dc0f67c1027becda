"""From the text of inquiry.toml, bid.toml and curve files to objects, every problem collected with file and line."""

from bidcheck.read.bid_curves import read_curve_file
from bidcheck.read.inquiry_folder import read_inquiry
from bidcheck.read.limit_sets import limit_set, limits_with

__all__ = ["limit_set", "limits_with", "read_curve_file", "read_inquiry"]

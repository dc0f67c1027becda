"""Generated documents say what the code says."""

from bidcheck.read import limit_set
from bidcheck.report import reference


def test_checks_page(golden):
    golden("docs/checks.md", reference.checks_page((limit_set("general-water"), limit_set("process"))))


def test_methods_page(golden):
    golden("docs/methods.md", reference.methods_page())

from bidcheck.checks import ALL
from bidcheck.quantity import UnitSystem
from bidcheck.read.limit_sets import limit_set
from bidcheck.report.reference import check_text, checks_list, checks_page, headline, methods_page

SETS = (limit_set("general-water"), limit_set("process"))


def test_every_check_is_listed_and_explained():
    listed, page = checks_list(), checks_page(SETS)
    for check in ALL:
        assert check.name in listed
        assert headline(check) in listed
        text = check_text(check, SETS[0], UnitSystem.SI)
        assert check.source in text
        assert all(name in text for name in check.limits)
        assert f"### {check.name}" in page


def test_explanations_say_more_than_their_headline():
    for check in ALL:
        assert len(check_text(check, SETS[1], UnitSystem.US)) > 300


def test_methods_name_their_source_and_mark():
    page = methods_page()
    for name in (
        "market_efficiency",
        "guelich_single_stage",
        "chart_efficiency",
        "npsh_available",
        "specific_speed",
    ):
        assert f"### {name}\n" in page
    assert page.count("- Source:") >= 20
    assert page.count("- Mark:") >= 20

import copy
import json
from dataclasses import replace
from importlib.resources import files

import jsonschema
import pytest

import bidcheck
from bidcheck.bid import Claims, Driver
from bidcheck.report.json_text import evaluation_json
from tests.build import EXAMPLES, inquiry, sound_bid, sound_curve

SCHEMA = json.loads(files("bidcheck.report").joinpath("evaluation.schema.json").read_text(encoding="utf-8"))


def written(folder: str = "cooling_water") -> dict[str, object]:
    loaded: dict[str, object] = json.loads(evaluation_json(bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / folder))))
    return loaded


@pytest.fixture(scope="module")
def document():
    return written()


def test_schema_is_a_schema_and_the_examples_keep_to_it(document):
    jsonschema.Draft202012Validator.check_schema(SCHEMA)
    jsonschema.validate(document, SCHEMA)
    jsonschema.validate(written("boiler_feed"), SCHEMA)


def test_an_almost_empty_bid_keeps_to_it():
    bare = sound_bid(claims=Claims(), driver=Driver(), curves=(sound_curve(npsh3=None, power=None, efficiency=None),))
    far = sound_bid(bidder="birch", curves=(sound_curve(impeller=0.3), sound_curve(impeller=0.5)))
    text = evaluation_json(bidcheck.evaluate(inquiry(bids=(bare, far))))
    document = json.loads(text)
    document["inputs"] = [{"file": "inquiry.toml", "sha256": "0" * 64}]
    jsonschema.validate(document, SCHEMA)
    assert document["bids"][0]["bep"] is None
    assert document["bids"][1]["at_duty"]["head_m"] == 62.3  # from the claims, and says so
    assert "head" in document["bids"][1]["at_duty"]["from_claims"]


@pytest.mark.parametrize(
    "break_it",
    [
        lambda d: d.update(extra=1),
        lambda d: d["bids"][0].update(outcome="fine"),
        lambda d: d["bids"][0]["findings"][0].update(verdict="ok"),
        lambda d: d["bids"][0]["findings"][0].pop("source"),
        lambda d: d["inquiry"]["duty"].update(flow_m3h="450"),
        lambda d: d["inputs"][0].update(sha256="abc"),
        lambda d: d.update(schema="bidcheck/evaluation/2"),
    ],
)
def test_a_broken_document_is_refused(document, break_it):
    broken = copy.deepcopy(document)
    break_it(broken)
    with pytest.raises(jsonschema.ValidationError):
        jsonschema.validate(broken, SCHEMA)


def test_figures_are_in_the_units_of_their_keys(document):
    duty = document["inquiry"]["duty"]
    assert duty == {"flow_m3h": 450.0, "head_m": 62.0, "npsha_m": 6.8}
    alder = document["bids"][0]
    assert alder["bidder"] == "alder"
    assert 60 < alder["at_duty"]["head_m"] < 65
    assert 0.8 < alder["at_duty"]["efficiency"] < 0.85
    assert 85 < alder["at_duty"]["power_kw"] < 100
    lo, hi = alder["fits"]["head"]["domain_m3h"]
    u = (2 * 450 - lo - hi) / (hi - lo)
    by_hand = sum(c * u**k for k, c in enumerate(alder["fits"]["head"]["coefficients"]))
    assert by_hand == pytest.approx(alder["at_duty"]["head_m"], rel=1e-6)
    assert alder["specific_speed"]["ns_us"] == pytest.approx(51.645 * alder["specific_speed"]["nq"], rel=1e-4)


def test_passes_are_listed_and_findings_unique(document):
    for bid in document["bids"]:
        keys = [(item["check"], item["subject"]) for item in bid["findings"]]
        assert len(keys) == len(set(keys))
        assert any(item["verdict"] == "pass" for item in bid["findings"])


def test_nothing_infinite_and_the_same_bytes_again():
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    assert evaluation_json(evaluation) == evaluation_json(evaluation)
    case = replace(evaluation.bids[0].case, estimates=replace(evaluation.bids[0].case.estimates, nq=float("nan")))
    odd = replace(evaluation, bids=(replace(evaluation.bids[0], case=case),))
    assert json.loads(evaluation_json(odd))["bids"][0]["specific_speed"]["nq"] is None


def test_every_source_of_every_bid_is_given_with_range_and_applicability(document):
    for bid in document["bids"]:
        estimates = bid["estimates"]
        groups = [
            estimates["efficiency"]["sources"],
            estimates["head_coefficient"]["sources"],
            estimates["npsh3"]["sources"],
            *(ratio["sources"] for ratio in estimates["shape"].values()),
        ]
        assert all(groups)
        for source in (source for group in groups for source in group):
            assert source["valid"]
            assert (source["value"] is None) == bool(source["reason"])
            assert source["mark"] in ("text", "crossed", "memory", "practice", "derived")
        names = " ".join(source["name"] for source in groups[0])
        for part in (
            "market survey, median",
            "floor since 2015",
            "US minimum",
            "statistics",
            "chart",
            "ceiling",
            "context",
        ):
            assert part in names

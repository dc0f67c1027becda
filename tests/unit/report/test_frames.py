import bidcheck
from tests.build import EXAMPLES


def test_frames_hold_every_finding_and_every_bidder():
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    findings = evaluation.findings_frame()
    assert len(findings) == sum(len(bid.findings) for bid in evaluation.bids)
    assert set(findings["bidder"]) == {"alder", "birch", "cedar", "dogwood", "elm"}
    table = evaluation.tabulation_frame()
    assert list(table.columns) == ["required", "alder a", "birch a", "cedar a", "dogwood a", "elm a"]
    assert table.loc["rated flow over best efficiency flow", "cedar a"] == "68 %"
    assert table.loc["rated flow over best efficiency flow", "required"] == "80 % to 110 %"

"""What a pump of a given duty should show, from sources that owe nothing to the bidder."""

"""From the text of inquiry.toml, bid.toml and curve files to objects, every problem collected with file and line."""

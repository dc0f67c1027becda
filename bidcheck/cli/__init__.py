"""The command line, one file per command; the only user of click."""

"""`python -m bidcheck` is the same as `bidcheck`."""

from bidcheck.cli import main

if __name__ == "__main__":
    main(prog_name="bidcheck")

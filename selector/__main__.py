"""Runs the program: `python -m selector`."""

from __future__ import annotations

import sys

from selector.cli.main import main

if __name__ == "__main__":
    sys.exit(main())

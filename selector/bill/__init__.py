"""A candidate as lines of a bill, with the cautions it earns."""

"""Times of the program against baselines that are measured beside it."""

"""What each command answers: a file for each, so that a command imports its own and no other."""

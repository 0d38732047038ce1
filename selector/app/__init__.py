"""The commands, one function each: they join the rooms below and hand back an answer; nothing is printed here."""

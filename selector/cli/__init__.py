"""The command line: options to the functions of app, answers to the standard output, faults to an exit status."""

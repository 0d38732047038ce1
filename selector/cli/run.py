"""One command line run: what comes out of it as an exit status, with its words on the standard error."""

from __future__ import annotations

from collections.abc import Sequence
from typing import cast

import typer

from selector.cli import faults
from selector.cli.arguments import command_of, hoisted
from selector.cli.root import program
from selector.cli.streams import EXIT_PIPE_CLOSED
from selector.errors import EXIT_DONE, EXIT_INPUT_REFUSED, EXIT_INTERRUPTED, EXIT_UNUSABLE, EXIT_USAGE, SelectorError

# The base of all errors of a command line, wherever the installed typer keeps it.
_UsageError = cast("type[Exception]", typer.BadParameter.__bases__[0])


def run(arguments: Sequence[str]) -> int:  # noqa: PLR0911 - one status for each way to end
    """Run a command and return its exit status; only signals are raised."""
    try:
        return _invoked(arguments)
    except SelectorError as error:
        faults.tell(error, _command(arguments))
        return error.exit_status
    except BrokenPipeError:
        return EXIT_PIPE_CLOSED
    except OSError as error:
        # what has no name is the stream that help and the version are printed to
        what = "cannot be written" if error.filename is None else "cannot be used"
        faults.lines([f"{error.filename or 'standard output'}: {what}: {error.strerror or error}"])
        return EXIT_UNUSABLE
    except MemoryError:
        faults.lines(["out of memory; close other programs, or ask for less"])
        return EXIT_UNUSABLE
    except RecursionError:
        faults.lines(["an input is nested too deep"])
        return EXIT_INPUT_REFUSED
    except ArithmeticError:
        faults.lines(["a figure of a part or of the spec is too large or too small to compute with; see them through"])
        return EXIT_INPUT_REFUSED


def _invoked(arguments: Sequence[str]) -> int:
    """Run a command and return its status; wrong usage is said and answered with its own."""
    ordered = hoisted(arguments)
    command = typer.main.get_command(program(command_of(arguments)))
    try:
        with command.make_context("selector", ordered) as context:
            command.invoke(context)
    except typer.Exit as ended:
        return ended.exit_code
    except typer.Abort:
        return EXIT_INTERRUPTED
    except _UsageError as error:
        _tell_usage(error)
        return EXIT_USAGE
    return EXIT_DONE


def _tell_usage(error: BaseException) -> None:
    """Say what is wrong with a command line; a command without its words shows its help."""
    context = getattr(error, "ctx", None)
    path = context.command_path if context is not None else "selector"
    message = error.format_message() if hasattr(error, "format_message") else str(error)
    if message.startswith("Usage:") or "\n" in message.strip():
        faults.lines(message.splitlines())
    else:
        faults.usage(message, path)


def _command(arguments: Sequence[str]) -> str:
    """Return the command named, where the arguments can be read at all."""
    try:
        return command_of(arguments)
    except SelectorError:
        return ""

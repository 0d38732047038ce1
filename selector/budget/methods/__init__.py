"""The ways of combining error terms, by the name a spec states."""

from selector.budget.methods.root_sum_square import RootSumSquare
from selector.budget.methods.worst_case import WorstCase

Combined = WorstCase | RootSumSquare

METHODS: dict[str, type[WorstCase] | type[RootSumSquare]] = {
    "worst-case": WorstCase,
    "rss": RootSumSquare,
}

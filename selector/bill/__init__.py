"""A candidate as lines of a bill, with the cautions it earns."""

from selector.bill.cautions import CAUTIONS
from selector.bill.line import BillLine, Offer
from selector.bill.lines import bill_lines
from selector.bill.offer import cautions_of, offer_of

__all__ = ["CAUTIONS", "BillLine", "Offer", "bill_lines", "cautions_of", "offer_of"]

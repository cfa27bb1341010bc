"""Expands rules with python-dateutil: JSON cases on standard input, JSON answers on standard output.

A case is {"dtstart": ISO time, "rrule": text, "most": how many occurrences}; its answer is a list of
ISO times, or null where dateutil itself fails on the rule.
"""

import json
import sys
from datetime import datetime
from itertools import islice

from dateutil.rrule import rrulestr


def answer(case):
    try:
        rule = rrulestr(case["rrule"], dtstart=datetime.fromisoformat(case["dtstart"]))
        return [at.isoformat() for at in islice(rule, case["most"])]
    except (IndexError, ValueError):
        return None


json.dump([answer(case) for case in json.load(sys.stdin)], sys.stdout)

"""Expands recurrence rules with python3-dateutil: JSON in on stdin, JSON out on stdout.

In:  [{"rule": "FREQ=DAILY", "start": "2020-01-01", "from": "2020-01-01", "to": "2020-02-01"}, ...]
Out: [["2020-01-01", ...], ...]
"""

import datetime
import json
import sys

from dateutil.rrule import rrulestr

# dateutil looks for occurrences until the calendar ends, minutes for a rule that fits no day. Nothing is
# asked of it after 2045, so its calendar may end there.
datetime.MAXYEAR = 2045


def midnight(day):
    return datetime.datetime.strptime(day, "%Y-%m-%d")


def expand(case):
    rule = rrulestr(case["rule"], dtstart=midnight(case["start"]))
    found = rule.between(midnight(case["from"]), midnight(case["to"]), inc=True)
    return [moment.strftime("%Y-%m-%d") for moment in found]


json.dump([expand(case) for case in json.load(sys.stdin)], sys.stdout)

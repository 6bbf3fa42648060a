"""Words of other standards and trades for the choices and liquids of the file: what was probably meant."""

from __future__ import annotations

from collections.abc import Iterable, Mapping

from ..faults import did_you_mean, listed
from ..misread import REID

_WORDS = {
    "SI": "metric|si units|mks",
    "US": "imperial|english|us customary|uscs|fps",
    "elbow": "bend|ell|knee",
    "equipment": "exchanger|heat exchanger|cooler|chiller|boiler|condenser|meter|flowmeter",
    "connector": "expansion joint|bellows|compensator|hose|flexible|flexible connector",
    "strainer": "filter|screen|basket",
    "entrance": "inlet|intake|mouth",
    "reducer": "taper|increaser|cone",
    "pipe": "straight|spool|duct",
    "fitting": "orifice|coupling|flange|union|cap",
    "plastic": "pvc|upvc|pvc-u|cpvc|pe|hdpe|pe100|pp|pvdf|abs|grp|frp",
    "commercial steel": "steel|carbon steel|mild steel|black steel|cs",
    "stainless steel": "stainless|ss|304|304l|316|316l",
    "galvanised steel": "galvanized steel|galvanised|galvanized|gi",
    "cast iron": "iron|ci|ductile iron|di",
    "cement-lined steel": "cement lined|cement-lined|mortar-lined steel",
    "open": "atmospheric|tank|basin|vented|sump|pond|river",
    "gas_blanketed": "blanketed|pressurised|pressurized|nitrogen|vessel|closed",
    "saturated": "boiling|deaerator|hotwell|flash",
    "loop": "closed loop|circuit|closed circuit",
    "main": "mains|network|header",
    "swing_check": "check|check valve|non-return|nrv|check_valve",
    "foot_hinged": "foot|foot valve|foot_valve",
    "run": "through|straight",
    "branch": "side|turn",
    "flush": "sharp|square|sharp-edged|square-edged",
    "inward": "projecting|re-entrant|borda",
    "bell": "bellmouth|bell mouth|rounded|trumpet",
    "crane": "crane tp-410|tp410|tp-410",
    "hooper_2k": "hooper|2k|2-k|two-k",
    "darby_3k": "darby|3k|3-k|three-k",
    "darcy_weisbach": "darcy|darcy-weisbach|colebrook",
    "hazen_williams": "hazen|hazen-williams|hw",
    "other": "npshi|npsh0|npsh1|incipient|none",
    "top": "up|above|flat side up",
    "bottom": "down|below|flat side down",
    "water": "h2o|condensate|fresh water|cold water|hot water|boiler feed water|river water|city water",
    "sea water": "seawater|sea-water|salt water",
    "ethylene glycol": "glycol|meg|eg",
    "propylene glycol": "glycol|pg|mpg",
    "glycerol": "glycerin|glycerine",
    "calcium chloride brine": "brine|calcium chloride|cacl2",
    "sodium chloride brine": "brine|sodium chloride|nacl",
    "ammonia": "nh3|r717|r-717",
    "propane": "r290|r-290|c3h8",
    "n-butane": "butane|r600",
    "isobutane": "i-butane|r600a",
    "methanol": "methyl alcohol",
    "ethanol": "alcohol|ethyl alcohol",
}
_MEANT: dict[str, list[str]] = {}
for _choice, _others in _WORDS.items():
    for _word in _others.split("|"):
        _MEANT.setdefault(_word, []).append(_choice)

#: Words for something else that resembles what is wanted -> why it cannot stand for it.
NOT_THAT: Mapping[str, str] = dict.fromkeys(("reid", "rvp", "reid_vapour_pressure", "reid_vapor_pressure"), REID)


def likely(word: str, choices: Iterable[str]) -> str:
    """``did you mean `elbow`?`` without the full stop, or an empty text.

    What another trade calls ``word``, or one of its words, goes before the choice that merely looks like it.
    """
    known = list(choices)
    for each in (word, *word.split()):
        also = [choice for choice in _MEANT.get(each.casefold(), ()) if choice in known]
        if also or each in known:
            return f"did you mean {listed(f'`{choice}`' for choice in also or [each])}?"
    return did_you_mean(word, known)

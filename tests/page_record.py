"""A record as the page receives it, written by hand for tests of the page: plant, documents and figures invented.

Lines are evaluated with the formula language only, so that the package reads like a real one; nothing here is an
expected value of the engineering.
"""

from __future__ import annotations

from decimal import Decimal
from typing import Any

from calcpack import formula
from calcpack.number import headline, of_record
from calcpack.symbols import NOMENCLATURE

UNITS = {"V": "ft/s", "A": "ft²", "A_i": "ft²", "V_i": "ft/s", "gamma": "lbf/ft³", "Re": "1", "r": "1", "f": "1", "K": "1", "Fr": "1"}
STANDARD = ("standard", "", "definition")


class Book:
    """Writes lines and keeps their values by address."""

    def __init__(self) -> None:
        self.inputs: list[dict[str, Any]] = []
        self.lines: dict[str, dict[str, Any]] = {}
        self.count = {"4": 0, "8": 0}

    def _address(self, section: str) -> str:
        self.count[section] += 1
        return f"{section}.{self.count[section]}"

    def _keep(self, section: str, **line: Any) -> dict[str, Any]:
        made = {
            "address": self._address(section), "formula": None, "operands": [], "source": "definition", "note": "",
            "key_result": False, "shadow": {"value": line["value"], "unit": "m"}, "fingerprint": "0123456789ab", **line,
        }
        if "headline" not in made:
            short = headline(Decimal(made["value"]), 3)
            made["headline"] = {"text": str(short), "unit": made["unit"]}
        self.lines[made["address"]] = made
        return made

    def given(self, symbol: str, title: str, text: str, place: str = "S1 4.1", status: str = "verified", note: str = "",
              confirm: str = "", kind: str = "given", reference: str = "") -> str:
        number, _, unit = text.partition(" ")
        source, _, where = place.partition(" ")
        line = self._keep(
            "4", kind=kind, title=title, symbol=symbol, value=number.replace("−", "-"), unit=unit.removesuffix(" absolute") or "1", given=text,
            reference=reference, key="some.key", file_line=20 + self.count["4"],
            provenance={"source": source, "place": where, "status": status, "note": note, "confirm": confirm},
        )
        self.inputs.append(line)
        return str(line["address"])

    def _operand(self, symbol: str, address: str) -> dict[str, str]:
        line = self.lines[address]
        return {"symbol": symbol, "value": line["value"], "unit": line["unit"], "address": address}

    def convert(self, address: str, text: str, to: str, factor: str) -> str:
        line = self.lines[address]
        value = self._value(text, {line["symbol"]: line["value"]})
        made = self._keep("8", kind="conversion", title=line["title"], symbol=line["symbol"], formula=text, value=value, unit=to,
                          operands=[self._operand(line["symbol"], address)], factor=factor, **{"from": line["unit"], "to": to})
        return str(made["address"])

    def equation(self, symbol: str, title: str, text: str, unit: str, source: str = "definition", **operands: str | list[str]) -> str:
        used, values = [], {}
        for name, where in operands.items():
            each = [where] if isinstance(where, str) else where
            used += [self._operand(name, a) for a in each]
            values[name] = self.lines[where]["value"] if isinstance(where, str) else [Decimal(self.lines[a]["value"]) for a in where]
        made = self._keep("8", kind="equation", title=title, symbol=symbol, formula=text, value=self._value(text, values), unit=unit,
                          operands=used, source=source)
        return str(made["address"])

    def lookup(self, symbol: str, title: str, function: str, value: str, unit: str, temperature: str) -> str:
        made = self._keep("8", kind="lookup", title=title, symbol=symbol, function=function, value=value, unit=unit, library="CoolProp 6.8.0",
                          formulation="IAPWS-95", source="R7 IAPWS-95, saturated liquid", operands=[self._operand("T", temperature)])
        return str(made["address"])

    def root(self, r: str, re: str) -> str:
        made = self._keep(
            "8", kind="root", title="Friction factor (Darcy), by its root", symbol="f", value="0.0159590", unit="1",
            formula="1 / sqrt(f) == -2 * log10(r / 3.7 + 2.51 / (Re * sqrt(f)))",
            source="R3 eq. of the transition curve; recalled, not re-read", note="turbulent, Re above 4000; the residual changes sign across the root",
            operands=[self._operand("r", r), self._operand("Re", re)],
            residuals=[["0.01595895", "1.43E-5"], ["0.0159590", "1.63E-6"], ["0.01595905", "-1.10E-5"]],
        )
        return str(made["address"])

    @staticmethod
    def _value(text: str, values: dict[str, Any]) -> str:
        decimals = {k: Decimal(v) if isinstance(v, str) else v for k, v in values.items()}
        return str(of_record(formula.evaluate(formula.parse(text), decimals, formula.InDecimal())))


def _side(book: Book, address: str, name: str, text: str) -> dict[str, Any]:
    line = book.lines[address]
    return {"symbol": line["symbol"], "name": name, "value": line["value"], "unit": line["unit"], "address": address,
            "headline": {"text": text, "unit": line["unit"]}}


def record(paper: str = "Letter") -> dict[str, Any]:
    """The record."""
    b = Book()
    flow = b.given("Q", "Flow of one pump, highest", "3600 gal/min", "S2 p. 1", "maker")
    level = b.given("z_s", "Lowest basin level above the datum", "4.0 ft", "S3 section B", "preliminary")
    datum = b.given("z_d", "Elevation of the pump's NPSH datum", "0 ft", "S2 p. 2", "maker")
    hot = b.given("T", "Highest water temperature", "85 °F", "S1 4.2")
    baro = b.given("p_b", "Lowest station barometer, absolute", "11.93 psi absolute", "S1 4.1", reference="absolute",
                   note="lowest of the station record 2009 to 2024")
    rough = b.given("eps", "Roughness of the suction line", "0.005 in", "", "assumed", "pipe aged 20 years, about three times new commercial steel",
                    "operations at the next opening")
    bore = b.given("D", "Bore, NPS 16 STD", "15.250 in", "R8 table 1")
    length = b.given("L", "Length of straight pipe, row 2", "38 ft", "S4 sheet 1")
    k_exp = b.given("K", "Expansion joint, row 7", "0.10", "S1 5.2")
    count = b.given("n", "Number of elbows, row 3", "2", "S4 sheet 1")
    screen = b.given("h_0", "In-line screen STR-7, fouled, at its reference flow", "2.9 ft", "S5", "maker")
    npshr = b.given("NPSHR", "Net positive suction head required at 3 600 gal/min", "23.5 ft", "S2 p. 2", "maker")
    ratio = b.given("M_r", "Margin ratio asked for", "1.10", "S1 4.3")
    bell = b.given("D_i", "Inlet diameter of the bell", "20 in", "S3 section B")
    lip = b.given("z_r", "Elevation of the bell lip", "0.50 ft", "S3 section B", "preliminary")
    g = b.given("g", "Standard acceleration of gravity", "32.1740 ft/s²", "", "", kind="constant")
    first = b.count["8"] + 1
    q = b.convert(flow, "Q * (77 / 34560)", "ft³/s", "77/34560")
    t = b.convert(hot, "(T + 459.67) * (5 / 9)", "K", "5/9")
    p = b.convert(baro, "p_b * 144", "lbf/ft²", "144")
    d = b.convert(bore, "D * (1 / 12)", "ft", "1/12")
    e = b.convert(rough, "eps * (1 / 12)", "ft", "1/12")
    di = b.convert(bell, "D_i * (1 / 12)", "ft", "1/12")
    rho_si = b.lookup("rho", "Density of saturated liquid", "rho(T)", "995.807", "kg/m³", t)
    rho = b.convert(rho_si, "rho * (28316846592 / 14593902937206.3648)", "slug/ft³", "28316846592/14593902937206.3648")
    mu_si = b.lookup("mu", "Dynamic viscosity", "mu(T)", "8.06744E-4", "Pa·s", t)
    mu = b.convert(mu_si, "mu * (2.5 / 119.7005)", "lbf·s/ft²", "2.5/119.7005")
    pv_si = b.lookup("p_v", "Vapour pressure, absolute", "p_sat(T)", "4113.39", "Pa", t)
    pv = b.convert(pv_si, "p_v * (145161 / 6950400)", "lbf/ft²", "145161/6950400")
    conversions_end = b.count["8"]
    gamma = b.equation("gamma", "Specific weight", "rho * g", "lbf/ft³", rho=rho, g=g)
    a = b.equation("A", "Area of the bore", "pi * D**2 / 4", "ft²", "geometry", D=d)
    v = b.equation("V", "Mean velocity", "Q / A", "ft/s", "continuity", Q=q, A=a)
    hv = b.equation("h_V", "Velocity head", "V**2 / (2 * g)", "ft", V=v, g=g)
    re = b.equation("Re", "Reynolds number", "rho * V * D / mu", "1", "turbulent above 4 000", rho=rho, V=v, D=d, mu=mu)
    r = b.equation("r", "Relative roughness", "eps / D", "1", eps=e, D=d)
    f = b.root(r, re)
    k_pipe = b.equation("K", "Loss coefficient of the straight pipe, row 2", "f * L / D", "1", "R4 Weisbach 1845; recalled, not re-read", f=f, L=length, D=d)
    eps_c = b.given("eps_c", "Roughness of clean commercial steel", "1.5E-4 ft", "R5 A-23", kind="constant", status="")
    f_t = b.equation("f_T", "Friction factor of fully rough flow in clean steel", "0.25 / log10(eps_c / (3.7 * D))**2", "1", "R5 app. A",
                     eps_c=eps_c, D=d)
    h_scr = b.equation("h", "Screen loss at this flow, row 6", "h_0 * (Q / Q_0)**2", "ft", "common practice, no source", h_0=screen, Q=q, Q_0=q)
    rows = []
    for row, element, k in (("1", "Bell entrance, 20 in to 16 in", f_t), ("2", "Straight pipe, 38 ft", k_pipe), ("3", "Elbow 90°, long radius, two", f_t),
                            ("7", "Expansion joint", k_exp)):
        h = b.equation("h", element, "n * K * h_V", "ft", "R4", n=count, K=k, h_V=hv)
        rows.append({"row": row, "element": element, "line": b.lines[h]})
    rows.insert(3, {"row": "6", "element": "In-line screen STR-7, fouled", "line": b.lines[h_scr]})
    h_l = b.equation("h_L", "Losses, surface to suction nozzle", "sum(h)", "ft", h=[x["line"]["address"] for x in rows])
    h_b = b.equation("H_b", "Barometer as head of this liquid", "p_b / gamma", "ft", p_b=p, gamma=gamma)
    h_vap = b.equation("H_v", "Vapour pressure as head of this liquid", "p_v / gamma", "ft", p_v=pv, gamma=gamma)
    z = b.equation("z", "Static head of the surface over the pump's datum", "z_s - z_d", "ft", "positive: flooded; negative: lift", z_s=level, z_d=datum)
    reading = b.given("z_g", "Gauge height over the pump's datum", "−1.25 ft", "S2 p. 3")
    h_g = b.equation("H_g", "Gauge reading as head of this liquid", "z_g - z_d + H_v", "ft", z_g=reading, z_d=datum, H_v=h_vap)
    npsha = b.equation("NPSHA", "Net positive suction head available", "H_b + z - h_L - H_v", "ft", "R2 NPSH; no velocity head: the surface is at rest",
                       H_b=h_b, z=z, h_L=h_l, H_v=h_vap)
    long = b.equation("NPSHA_m", "Net positive suction head available, measured", "H_b + H_g + z_g + h_V - H_v", "ft", "R9 NPSH from inlet pressure",
                      H_b=h_b, H_g=h_g, z_g=reading, h_V=hv, H_v=h_vap)
    need = b.equation("N_L", "NPSH needed by the margin ratio", "M_r * NPSHR", "ft", M_r=ratio, NPSHR=npshr)
    area = b.equation("A_i", "Area of the inlet", "pi * D_i**2 / 4", "ft²", D_i=di)
    vi = b.equation("V_i", "Mean velocity at the inlet", "Q / A_i", "ft/s", Q=q, A_i=area)
    fr = b.equation("Fr", "Froude number of the inlet", "V_i / sqrt(g * D_i)", "1", "R6 9.8.7", V_i=vi, g=g, D_i=di)
    s_m = b.equation("S_m", "Submergence needed against vortices", "D_i * (1 + 2.3 * Fr)", "ft", "R6 9.8.7", D_i=di, Fr=fr)
    s = b.equation("S", "Submergence there is over the bell lip", "z_s - z_r", "ft", z_s=level, z_r=lip)
    for key in (npsha, s_m, need, long):
        b.lines[key]["key_result"] = True
    in_table = {x["line"]["address"] for x in rows if x["row"] != "6"} | {h_l}
    numbered = [line for line in b.lines.values() if line["address"].startswith("8.") and line["address"] not in in_table]
    blocks: list[dict[str, Any]] = [{"group": "Conversions"}]
    for line in numbered:
        n = int(line["address"].split(".")[1])
        blocks += [{"group": "Velocity in the 16 in line"}] if n == conversions_end + 1 else []
        if line["address"] == h_b:
            blocks += [{"losses": {"title": "Losses, surface to suction nozzle: 3 600 gal/min, bore 15.250 in, 85 °F", "rows": rows,
                                   "total": b.lines[h_l], "worked": "3"}}, {"group": "Net positive suction head available, at the datum"}]
        blocks.append({"line": line})
    used = {"4.1": q, "4.4": t, "4.5": p, "4.6": e, "4.7": d, "4.14": di}
    inputs = []
    for line in b.inputs:
        address = used.get(line["address"], line["address"])
        inputs.append({**line, "used": {"value": b.lines[address]["value"], "unit": b.lines[address]["unit"], "address": address}})
    symbols = dict.fromkeys(s for line in b.lines.values() for s in [line["symbol"], *(o["symbol"] for o in line["operands"])])
    available, limit = b.lines[npsha]["value"], b.lines[need]["value"]
    assert first == 1
    return {
        "format": "calcpack record 1",
        "calculation": {
            "number": "CF-21-C-004", "title": "Condenser water pumps P-7 A/B, suction check", "revision": "B", "date": "2026-11-16",
            "owner": "Cinder Fork District Energy (invented)", "project": "Cinder Fork cooling plant (invented)", "status": "for check",
            "units": "US", "paper": paper, "datum": "centreline of the pump shaft, 5 302.0 ft above sea level",
            "system": "P-7 A/B from cooling tower basin CT-1",
        },
        "revisions": [{"revision": "A", "date": "2026-10-02", "reason": "first issue for check"},
                      {"revision": "B", "date": "2026-11-16", "reason": "screen as the maker now states it; bell lip as built"}],
        "route": "both",
        "cover": {
            "verdict": "not met",
            "statement": "At the lowest level the suction bell has 3.50 ft of water over it and needs 3.60 ft: short by 0.10 ft. NPSH is met, by 0.30 ft of 25.85 ft.",
            "tally": {"met": 1, "not met": 1, "not applicable": 1, "not assessed": 1}, "governing": "9.2",
            "counts": {"verified": 9, "maker": 4, "preliminary": 2, "assumed": 1, "without source": 1},
            "unverified": [{"address": "4.1", "what": "flow of one pump", "status": "maker"}, {"address": "4.2", "what": "lowest level", "status": "preliminary"},
                           {"address": "4.6", "what": "roughness", "status": "assumed"}, {"address": "4.12", "what": "NPSHR", "status": "maker"}],
            "confirm": [{"address": "5.1", "what": "roughness of the suction line", "who": "operations at the next opening"}],
            "rounding": "largest effect of line rounding 0.000 02 ft on NPSHA; limit 0.001 ft",
        },
        "purpose": ["To show whether the suction side of P-7 A/B gives the pumps the head they need at the lowest basin level."],
        "scope": ["One pump at its highest flow, drawing from cooling tower basin CT-1 through the 16 in suction line."],
        "exclusions": ["Transients, air binding, vibration, structural loads."],
        "criteria": [{"rule": "9.1", "text": "NPSH available is at least 1.1 times NPSH required", "source": "S1 4.3"},
                     {"rule": "9.2", "text": "Submergence is at least S = D (1 + 2.3 F)", "source": "S1 4.4; R6 9.8.7"}],
        "method": ["The design route: from the surface of the basin, level and barometer less vapour pressure and every loss on the way.",
                   "It is taken because nothing is built: there is no gauge to read."],
        "inputs": inputs,
        "assumptions": [{"address": "5.1", "text": "Roughness of the pipe after 20 years is 0.005 in", "basis": "three times new commercial steel",
                         "consequence": "0.04 ft of NPSH available against new pipe", "confirm": "operations at the next opening"},
                        {"address": "5.2", "text": "The maker's datum is the impeller eye", "basis": "horizontal shaft, double suction",
                         "consequence": "none within 0.1 ft", "confirm": ""}],
        "references": [{"id": "S1", "text": "Mechanical design criteria, CF-DC-02, rev 3"}, {"id": "S2", "text": "Pump data sheet and curve 7-1140, 2026-08"},
                       {"id": "R3", "text": "Colebrook, C. F.: Turbulent flow in pipes. J. Inst. Civil Engineers 11 (1939) 133-156. Recalled, not re-read"}],
        "sketch": {
            "unit": "ft", "supply": {"name": "Cooling tower basin CT-1", "kind": "open",
                                     "levels": [{"name": "lowest level", "value": "4.0"}, {"name": "normal level", "value": "5.0"}]},
            "datum": "pump shaft centreline", "pump": {"name": "P-7 A/B", "elevation": "0"},
            "intake": {"reference": "bell_lip", "elevation": "0.5", "diameter": "1.667"},
            "elements": [{"row": "1", "kind": "entrance", "name": "Bell"}, {"row": "2", "kind": "pipe", "name": "Pipe, 38 ft"},
                         {"row": "3", "kind": "elbow", "name": "Elbows"}, {"row": "4", "kind": "valve", "name": "Butterfly valve"},
                         {"row": "5", "kind": "tee", "name": "Tee"}, {"row": "6", "kind": "strainer", "name": "Screen"},
                         {"row": "7", "kind": "fitting", "name": "Joint"}],
            "gauge": {"elevation": "-1.25", "leg": "filled"},
            "heads": [{"name": "barometer", "value": b.lines[h_b]["value"]}, {"name": "level", "value": "4.0"},
                      {"name": "losses", "value": "-" + b.lines[h_l]["value"]}, {"name": "vapour pressure", "value": "-" + b.lines[h_vap]["value"]}],
            "available": available, "limit": limit,
        },
        "computation": [{"title": "Design route, worst case", "scope": "lowest level, 85 °F, highest flow, screen fouled", "blocks": blocks}],
        "checks": _checks(b, npsha, need, s, s_m),
        "findings": [{"text": "The loss between surface and tap is larger than the model says", "reason": "2.3 ft against 1.1 ft; a partly closed valve would show so"}],
        "limits": [{"what": "flow of one pump", "limit": "not above 3 600 gal/min", "address": "4.1"},
                   {"what": "basin level", "limit": "not below 4.0 ft", "address": "4.2"}, {"what": "water temperature", "limit": "not above 85 °F", "address": "4.4"}],
        "cautions": ["A qualified engineer reviews this package before anyone relies on it.", "Local codes were not looked into."],
        "software": [{"name": "calcpack", "version": "0.1.0", "role": "this calculation"}, {"name": "CoolProp", "version": "6.8.0", "role": "properties of water"}],
        "rounding": [{"address": npsha, "what": "NPSH available", "record": available, "shadow": "26.157012", "unit": "ft", "drift": "0.00002", "limit": "0.001"}],
        "conversions": [{"from": "gal/min", "to": "ft³/s", "factor": "77/34560", "source": "NIST SP 811 app. B"},
                        {"from": "in", "to": "ft", "factor": "1/12", "source": "definition"}, {"from": "psi", "to": "lbf/ft²", "factor": "144", "source": "definition"}],
        "nomenclature": [{"name": n, "base": NOMENCLATURE[n].base, "sub": NOMENCLATURE[n].sub, "upright": NOMENCLATURE[n].upright,
                          "meaning": NOMENCLATURE[n].meaning, "unit": UNITS.get(n, "ft")} for n in symbols],
        "input_file": {"name": "a_cooling_tower_basin.yaml", "sha256": "5c1ea9073bd248f09e6a1174c0d872fb0a35e64c91d72f08bb1670ea4d9385c2",
                       "text": "calculation:\n  number: CF-21-C-004\n  title: Condenser water pumps P-7 A/B, suction check\n" + "\n".join(
                           f"  - {{id: {i}, kind: fitting, name: \"a rather long name of a fitting that runs past the measure of the page, number {i}\", K: 0.10, source: S1 5.2}}"
                           for i in range(70)) + "\n"},
        "fingerprint": "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08",
    }


def _checks(b: Book, npsha: str, need: str, s: str, s_m: str) -> list[dict[str, Any]]:
    common = {"fingerprint": "0123456789ab", "source": "S1 4.3"}
    return [
        {**common, "address": "9.1", "id": "npsh_margin", "title": "NPSH available with its margin", "formula": "NPSHA >= N_L", "relation": "≥",
         "left": _side(b, npsha, "available", "26.15"), "right": _side(b, need, "1.1 × required", "25.85"), "verdict": "met",
         "reason": "by 1.2 %", "criterion": "NPSH available is at least 1.1 times NPSH required",
         "margin": {"value": "0.307", "unit": "ft", "headline": {"text": "0.30", "unit": "ft"}, "percent": "1.2"}},
        {**common, "address": "9.2", "id": "submergence", "title": "Submergence over the bell", "formula": "S >= S_m", "relation": "≥",
         "left": _side(b, s, "there is", "3.50"), "right": _side(b, s_m, "needed", "3.60"), "verdict": "not met",
         "reason": "of record 3.500 00 ft against 3.591 22 ft: short by 0.091 ft", "criterion": "Submergence is at least D (1 + 2.3 F)",
         "margin": {"value": "-0.091", "unit": "ft", "headline": {"text": "-0.10", "unit": "ft"}, "percent": "-2.5"}},
        {**common, "address": "9.3", "id": "gauge_leg", "title": "Gauge leg", "formula": "", "relation": "", "left": None, "right": None,
         "verdict": "not applicable", "reason": "there is no gauge on the line", "criterion": "", "margin": None},
        {**common, "address": "9.4", "id": "temperature", "title": "Temperature rise", "formula": "", "relation": "", "left": None, "right": None,
         "verdict": "not assessed", "reason": "no average temperature is given", "criterion": "", "margin": None},
    ]

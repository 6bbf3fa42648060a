"""The mistakes of the sample inputs: what each file gives rise to, and the file that is right."""

from __future__ import annotations

from dataclasses import dataclass
from pathlib import Path

import calcpack

SAMPLES = Path(calcpack.__file__).parent.parent / "sample_inputs"
FOLDER = SAMPLES / "mistakes"


@dataclass(frozen=True)
class Row:
    """A file with one mistake.

    ``name`` is its finding, the rule it fails, or the fault it is refused for, as ``by`` says.  ``clean`` is the file without
    it.  ``factor``: within how much the head shown is that by which NPSH available moved; 0 where none is shown or none moves.
    """

    file: str
    name: str
    clean: str
    factor: float = 0.0
    by: str = "finding"

    @property
    def path(self) -> Path:
        return FOLDER / f"{self.file}.yaml"

    @property
    def clean_path(self) -> Path:
        return next(p for p in (SAMPLES / f"{self.clean}.yaml", FOLDER / f"{self.clean}.yaml") if p.exists())


A, B, C, D = (
    "a_cooling_tower_basin",
    "b_river_intake_measured",
    "c_transfer_pump_both_routes",
    "d_blanketed_hot_water_vessel",
)
E, F, G, H = "e_deaerator_feed", "f_propane_sphere", "g_glycol_loop", "h_wet_pit"
I, I2, J, K = "right_three_pumps", "right_one_pump_alone", "j_viscous_oil", "k_triplex_plunger"  # noqa: E741
ROWS = (
    Row("gauge_as_absolute", "gauge_as_absolute", "right_cold_blanket", 1.01),
    Row("gauge_as_absolute_hot", "value", D, by="fault"),
    Row("barometer_twice", "barometer_twice", D, 1.01),
    Row("barometer_twice_vented", "barometer_twice", "right_cold_blanket", 1.3),
    Row("barometer_twice_loop", "barometer_twice", G, 1.05),
    Row("vacuum_as_absolute", "vacuum_as_absolute", "right_vacuum_vessel", 1.01),
    Row("vacuum_as_absolute_hotwell", "vacuum_as_absolute", "right_hotwell"),
    Row("vacuum_as_absolute_reading", "reference", B, by="fault"),
    Row("vacuum_without_sign", "vacuum_without_sign", B),
    Row("absolute_as_gauge", "absolute_as_gauge", B),
    Row("reading_above_surface", "reading_above_surface", B),
    Row("sea_level_barometer", "sea_level_barometer", A, 1.1),
    Row("sea_level_barometer_no_elevation", "sea_level_barometer", D, 1.2),
    Row("airport_pressure", "airport_pressure", "right_high_intake", 1.1),
    Row("airport_pressure_no_elevation", "airport_pressure", "right_high_intake", 1.2),
    Row("airport_pressure_lowest", "airport_pressure", "right_high_intake", 1.3),
    Row("gauge_height", "gauge_height", B),
    Row("gauge_height_over_the_pump", "gauge_height", "right_grid_intake", 1.2),
    Row("wrong_datum", "wrong_datum", H, 1.2),
    Row("wrong_datum_bell", "wrong_datum", H, 1.3),
    Row("wrong_datum_floor", "wrong_datum", D),
    Row("wrong_datum_line_end", "wrong_datum", I, 1.01),
    Row("pipe_too_short", "pipe_too_short", E),
    Row("entrance_off_inlet", "entrance_off_inlet", E),
    Row("average_temperature", "highest_temperature", B, by="rule"),
    Row("normal_temperature", "highest_temperature", D, by="rule"),
    Row("highest_temperature_is_normal", "highest_temperature_is_normal", D, 1.2),
    Row("normal_level_only", "missing key", B, by="fault"),
    Row("lowest_level_is_normal", "lowest_level_is_normal", D),
    Row("lowest_pressure_is_normal", "lowest_pressure_is_normal", D),
    Row("highest_flow_is_normal", "highest_flow_is_normal", A, 1.4),
    Row("npsh_at_rated_flow", "tested_range_high", A, by="rule"),
    Row("velocity_head_counted", "velocity_head_counted", D, 1.01),
    Row("velocity_head_counted_exit", "velocity_head_counted", I2, 1.01),
    Row("velocity_head_withheld", "velocity_head_counted", D, 1.01),
    Row("velocity_head_negative", "range", C, by="fault"),
    Row("velocity_head_left_out", "velocity_head_left_out", "right_transfer", 1.01),
    Row("velocity_head_left_out_no_line", "velocity_head_left_out", B),
    Row("clean_strainer", "clean_strainer", A, 3),
    Row("clean_strainer_alone", "clean_strainer", F, 1.5),
    Row("density_of_cold_water", "density_of_cold_water", D, 1.2),
    Row("density_of_cold_water_propane", "density_of_cold_water", F),
    Row("density_of_cold_water_oil", "density_of_cold_water", J),
    Row("npsh_as_head_of_water", "dimension", F, by="fault"),
    Row("mixed_sets_unawares", "fitting", C, by="fault"),
    Row("mixed_sets", "mixed_sets", "right_transfer"),
    Row("no_entrance", "no_entrance", "right_transfer", 1.01),
    Row("fanning_factor", "fanning_factor", D, 1.01),
    Row("new_wall", "new_wall", E, 1.01),
    Row("new_wall_read", "new_wall", "right_transfer", 1.01),
    Row("station_flow", "station_flow", H),
    Row("station_flow_header", "station_flow", I, 1.05),
    Row("station_flow_bell", "station_flow", I),
    Row("submergence_as_npsh", "submergence_as_npsh", "right_transfer"),
    Row("margin_left_out", "missing key", C, by="fault"),
    Row("reid_vapour_pressure", "choice", F, by="fault"),
    Row("reid_vapour_pressure_unawares", "property_of_another_liquid", "right_hexane", 1.01),
    Row("saturated_as_blanketed", "saturated_as_blanketed", E, 1.05),
    Row("saturated_as_blanketed_sphere", "saturated_as_blanketed", F, 1.05),
    Row("saturated_boils", "value", E, by="fault"),
    Row("double_suction", "double_suction", "right_double_suction"),
    Row("double_suction_named", "double_suction", "right_double_suction"),
    Row("no_margin", "no_margin", "right_transfer"),
    Row("not_npsh3", "not_npsh3", D),
    Row("curve_falls", "curve_falls", E),
    Row("service_of_another_pump", "service_of_another_pump", K),
    Row("reading_beyond_extremes", "reading_beyond_extremes", B),
    Row("property_of_another_liquid", "property_of_another_liquid", "right_transfer"),
    Row("table_runs_back", "table_runs_back", J),
    Row("far_apart", "far_apart", "right_double_suction", 1.02),
)
#: Findings of files that are right, and that are true of them: a plant with readings and a wall taken as new; pumps of positive
#: displacement, whose makers state NPSH required on a basis of their own.
EXPECTED = {C: {"new_wall"}, J: {"not_npsh3"}, K: {"not_npsh3"}}
FOUND = tuple(row for row in ROWS if row.by == "finding")

#include "writing/starters.hpp"

namespace groundsill {

namespace {

constexpr std::string_view beam = R"toml(# A floor beam over three supports, one of which may go down.
#
# Look at it before anything is solved:   groundsill sketch THIS_FILE
# Analyse it:                             groundsill run THIS_FILE
#
# A quantity is a text with its unit. Axes: x to the right, y up, rotation counter-clockwise.

title = "Sail loft: floor beam on line 2"

[materials.pine]
E = "11 GPa"
density = "420 kg/m3"          # needed because self_weight acts below

[sections.bearer]
shape = "rectangle"            # also circle, pipe, box, i, tee, channel; or give A and I
width = "200 mm"
depth = "400 mm"

# A straight run of spans. It makes the nodes A, B, C and the members floor.1, floor.2, from the origin to the right.
[beams.floor]
nodes = ["A", "B", "C"]
spans = ["5 m", "4.2 m"]
section = "bearer"
material = "pine"

[supports]
A = "pinned"                   # holds x and y; "fixed" holds the rotation too
B = { y = "30 MN/m" }          # a column that gives: a spring
C = "roller"                   # holds y

[cases.dead]
action = "permanent"
loads = [
  { self_weight = 1.0 },
  { beam = "floor", y = "-2.5 kN/m" },               # down is negative
]

[cases.stores]
action = "imposed"
loads = [
  { beam = "floor", y = "-6 kN/m" },
  { member = "floor.1", y = "-8 kN", at = "2 m" },   # a point load, 2 m from the start of its member
]

[cases.sinking]
action = "settlement"
loads = [{ support = "B", y = "-10 mm" }]            # the foot of the column goes down

[combinations.strength]
factors = { dead = 1.35, stores = 1.5 }
[combinations.strength_sunk]
factors = { dead = 1.35, stores = 1.5, sinking = 1.0 }
[combinations.usual]
limit = "service"                                    # default: "strength"
factors = { dead = 1.0, stores = 1.0, sinking = 1.0 }
)toml";

constexpr std::string_view portal =
    R"toml(# A portal frame on pinned bases under its own weight, snow and wind from the left.
#
# Look at it before anything is solved:   groundsill sketch THIS_FILE
# Analyse it:                             groundsill run THIS_FILE

title = "Rope store: portal on line 4"

[units]                        # with this table bare numbers are allowed: here metres and kilonewtons
length = "m"
force = "kN"

[materials.steel]
E = "210 GPa"
density = "7850 kg/m3"

[sections.leg]                 # by properties
A = "6260 mm2"
I = "11770 cm4"
[sections.rafter]              # by shape
shape = "i"
depth = "360 mm"
width = "170 mm"
web = "8 mm"
flange = "12.7 mm"

[nodes]
left_base = [0, 0]
left_eaves = [0, 4.5]
ridge = [6, 5.7]
right_eaves = [12, 4.5]
right_base = [12, 0]

# A member's own axis runs from `from` to `to`; positive bending puts its right-hand side, seen along that axis, in tension.
[members]
left_leg = { from = "left_base", to = "left_eaves", section = "leg", material = "steel" }
left_rafter = { from = "left_eaves", to = "ridge", section = "rafter", material = "steel" }
right_rafter = { from = "ridge", to = "right_eaves", section = "rafter", material = "steel" }
right_leg = { from = "right_eaves", to = "right_base", section = "leg", material = "steel" }

[supports]
left_base = "pinned"
right_base = "pinned"

[cases.dead]
action = "permanent"
loads = [
  { self_weight = 1.0 },
  { members = ["left_rafter", "right_rafter"], y = -1.8 },                # kN for each metre of the rafter
]

[cases.snow]
action = "snow"
loads = [{ members = ["left_rafter", "right_rafter"], y = -3.6, per = "plan" }] # for each metre in plan

[cases.wind]
action = "wind"
loads = [
  { member = "left_leg", x = 2.4 },
  { member = "right_leg", x = 1.2 },
  { members = ["left_rafter", "right_rafter"], across = 1.9 },            # suction, square to the roof
]

[combinations.snow_leads]
factors = { dead = 1.35, snow = 1.5, wind = 0.9 }
[combinations.uplift]
factors = { dead = 1.0, wind = 1.5 }
[combinations.usual]
limit = "service"
factors = { dead = 1.0, snow = 1.0, wind = 0.6 }
)toml";

constexpr std::string_view grade_beam =
    R"toml(# A strip beam that carries four columns and stands on four springs, the ground under its footings.
#
# Look at it before anything is solved:   groundsill sketch THIS_FILE
# Analyse it:                             groundsill run THIS_FILE

title = "Quay shop: grade beam along the east wall"

[materials.concrete]
E = "31 GPa"
poisson = 0.2                  # needed because the section is shear-flexible
density = "2500 kg/m3"

[sections.strip]
shape = "rectangle"
width = "600 mm"
depth = "800 mm"
shear = true                   # take its usual shear area: deep beams give in shear too

[nodes]
N1 = ["0 m", "0 m"]
N2 = ["4.8 m", "0 m"]
N3 = ["9.6 m", "0 m"]
N4 = ["14.4 m", "0 m"]

[members]                      # stiffness_factor: a cracked member keeps a part of its stiffness
S12 = { from = "N1", to = "N2", section = "strip", material = "concrete" }
S23 = { from = "N2", to = "N3", section = "strip", material = "concrete", stiffness_factor = 0.6 }
S34 = { from = "N3", to = "N4", section = "strip", material = "concrete" }

[supports]                     # x, y, rotation: "fixed", "free" or a stiffness; what is not said is free
N1 = { x = "fixed", y = "45 MN/m", rotation = "20 MN m/rad" }
N2 = { y = "60 MN/m" }
N3 = { y = "25 MN/m" }         # over the old ditch
N4 = { y = "45 MN/m", rotation = "20 MN m/rad" }

[cases.dead]
action = "permanent"
loads = [
  { self_weight = 1.0 },
  { node = "N1", y = "-180 kN" },
  { node = "N2", y = "-310 kN" },
  { node = "N3", y = "-310 kN" },
  { node = "N4", y = "-180 kN", moment = "15 kN m" },
  { members = ["S12", "S34"], y = "-14 kN/m" },                                        # the wall
  { member = "S23", y = ["-14 kN/m", "-6 kN/m"], between = ["0.5 m", "4.3 m"] },       # a part of it, lower to the right
]

[cases.imposed]
action = "imposed"
loads = [{ node = "N2", y = "-140 kN" }, { node = "N3", y = "-140 kN" }]

[cases.ditch]
action = "settlement"
loads = [{ support = "N3", y = "-15 mm" }]           # the ground goes down; the spring stays between it and the beam

[combinations.strength]
factors = { dead = 1.35, imposed = 1.5 }
[combinations.strength_ditch]
factors = { dead = 1.35, imposed = 1.5, ditch = 1.2 }
[combinations.usual]
limit = "service"
factors = { dead = 1.0, imposed = 0.3, ditch = 1.0 }
)toml";

} // namespace

std::optional<std::string> starter_model(std::string_view kind) {
    if (kind == "beam") return std::string(beam);
    if (kind == "portal") return std::string(portal);
    if (kind == "grade-beam") return std::string(grade_beam);
    return std::nullopt;
}

} // namespace groundsill

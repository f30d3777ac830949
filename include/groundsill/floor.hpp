#pragma once
// Screening of a floor for the vibration that one walker causes, by published hand methods on the model's modes.
//
// The model is one beam of the floor and the strip of floor, one `spacing` wide, that it carries. Everything in SI.
// Methods and sources:
//   DG11      Murray, Allen and Ungar, Floor Vibrations Due to Human Activity, AISC Design Guide 11, 1997 (equation
//   numbers);
//             its second edition, 2016, for the range of the method.
//   EN 1995   EN 1995-1-1:2004, 7.3 (timber floors of dwellings); load distribution as in the UK National Annex.
//   CCIP-016  Willford and Young, A Design Guide for Footfall Induced Vibration of Structures, The Concrete Centre,
//   2006;
//             base curve of ISO 10137:2007 and BS 6472:1992.
// Not covered: crowds, rhythmic activity, stairs; check_floor refuses them and names the document to go to.

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "groundsill/diagnostics.hpp"

namespace groundsill {

enum class FloorMethod { dg11, en1995, ccip016 };

/// The name that the model file and the results give a method: "DG11", "EN 1995", "CCIP-016".
std::string_view floor_method_name(FloorMethod method);

/// The method of that name. \param error set to what is wrong and the names allowed when there is none.
std::optional<FloorMethod> floor_method(std::string_view name, std::string& error);

/// The table [floor] of a model.
struct FloorModel {
    /// [floor.panel] girder: the girder that carries the beams' ends, for the combined panel of DG11.
    struct Girder {
        double E = 0;            ///< Pa
        double I = 0;            ///< m4
        double span = 0;         ///< m
        double weight = 0;       ///< all that it carries, floor and itself, N/m
        double floor_length = 0; ///< of the floor along the beams, m
        bool seats = false;      ///< beams on joist seats: C_g = 1.6; else connected to the web: 1.8
    };
    /// [floor.panel]: the effective weight by DG11.
    struct Panel {
        std::optional<double> weight{};     ///< effective weight W given, N
        std::optional<double> slab_depth{}; ///< effective depth d_e, m
        std::optional<double> slab_E{};     ///< static modulus of the slab's concrete, Pa; the guide's 1.35 is applied
        std::optional<double> slab_stiffness{}; ///< dynamic, in place of depth and modulus, N m2 per metre of width
        std::optional<double> floor_width{};    ///< of the floor across the beams, m
        bool edge = false;                      ///< the panel lies at a free edge: C_j = 1
        bool continuous = false; ///< beams continuous over their supports, adjacent span above 0.7 of this: W_j x 1.5
        std::optional<Girder> girder{};
        Position position{};
    };
    /// [floor.timber]: EN 1995-1-1 7.3.3.
    struct Timber {
        double width = 0;                         ///< b of the floor, m
        double transverse = 0;                    ///< (EI)_b, N m2/m
        std::optional<double> deflection_limit{}; ///< a, m/N
        std::optional<double> velocity_limit{};   ///< b, a number
        Position position{};
    };
    /// [floor.footfall]: CCIP-016.
    struct Footfall {
        double pace_least = 0;                   ///< Hz
        double pace_most = 0;                    ///< Hz
        std::optional<double> walk{};            ///< length of the walking path, m; absent: full build-up
        double stride = 0.75;                    ///< m
        double walker = 700;                     ///< weight, N
        std::optional<double> effective_width{}; ///< of the floor that moves with the strip, m
        Position position{};
    };

    std::vector<int> members;                 ///< indices into the model's members
    std::vector<FloorMethod> methods;         ///< in the order of the file
    std::string use;                          ///< an occupancy word of every method asked for
    std::optional<double> acceleration_limit; ///< peak, over g (DG11)
    std::optional<double> response_limit;     ///< response factor (CCIP-016)
    std::optional<double> damping;            ///< ratio to critical; EN 1995 alone may leave it out
    std::optional<double> target;             ///< frequency to reach, Hz; answered by the modes, not by the screening
    std::optional<double> spacing;            ///< width of floor that mass and stiffness of the model stand for, m
    std::optional<Panel> panel;
    std::optional<Timber> timber;
    std::optional<Footfall> footfall;
    Position position;     ///< of the table
    Position use_position; ///< of its `use`
};

/// What the methods need of one mode of the model.
struct FloorMode {
    double frequency = 0;     ///< Hz
    double modal_mass = 0;    ///< kg, for largest translation 1 anywhere in the model
    double vertical = 0;      ///< largest absolute vertical movement on the floor's members on that scale, 0 to 1
    bool is_vertical = false; ///< a mode of the floor: it counts as first vertical mode
};

/// What the methods need of the analysed model.
struct FloorInput {
    std::vector<FloorMode> modes; ///< rising frequencies; rigid-body modes left out
    double static_deflection =
        0; ///< largest downward movement of the floor's members under the weight of the mass, m; 0: none
    double point_deflection = 0;  ///< largest vertical deflection of the floor's members where 1 N acts on them, m/N
    double span = 0;              ///< of the beam, between supports, where the first vertical mode is largest, m
    double bending_stiffness = 0; ///< E I of that beam, N m2
    double mass_per_length = 0;   ///< mean on that span, of the whole strip, kg/m
    bool shear_flexible = false;  ///< point_deflection contains the shear deflection
};

/// One step of the calculation, to be printed for checking by hand.
struct FloorQuantity {
    std::string name;   ///< in words
    std::string symbol; ///< as in the method, ASCII; unique in its result, so that it can serve as a key
    double value = 0;   ///< SI
    std::string unit;   ///< "m", "N m2/m"; empty for a number
    std::string clause; ///< of the method, or "model" for what the model gave
};

/// CCIP-016 at one pace.
struct PaceResponse {
    double pace = 0;                 ///< Hz
    std::optional<double> resonant;  ///< response factor; absent where no mode can be in resonance
    std::optional<double> impulsive; ///< response factor; absent where no mode lies above the cut-off
    double response = 0;             ///< the larger of the two
};

/// The outcome of one method.
struct FloorResult {
    FloorMethod method = FloorMethod::dg11;
    std::string use;
    std::vector<FloorQuantity> quantities; ///< in the order in which they are calculated
    std::string criterion;                 ///< what `value` is, in words
    std::string unit;                      ///< of value and limit; empty for a number
    std::optional<double> value;           ///< of the governing criterion; absent when the model has no vertical mode
    std::optional<double> limit;
    std::optional<double> utilisation; ///< above 1: too much; for a frequency that must be high, limit / value
    bool passed = false;
    std::vector<PaceResponse> over_pace; ///< CCIP-016: by rising pace
    std::vector<std::string> warnings;
};

/// Checks of the table that need no analysis: what each method asks for is there, sizes are possible, the occupancy is
/// one of every method's words, activities outside the methods are refused with the document that covers them.
Diagnostics check_floor(const FloorModel& floor);

/// Screens the floor by each of its methods, one result a method in the order of the file.
/// DG11: peak acceleration over g of the beam panel or, with a girder, of the combined panel. EN 1995: the governing
/// one of frequency, deflection under 1 kN and unit impulse velocity response. CCIP-016: the largest response factor
/// over the paces. Walker and receiver stand together where each mode's vertical movement on the floor is largest.
///
/// \pre check_floor has no errors; input.modes rise; span, bending_stiffness, mass_per_length and, for EN 1995,
///      point_deflection are above 0
///
/// \return results without value, not passed and with a warning, when no mode is vertical
std::vector<FloorResult> screen_floor(const FloorModel& floor, const FloorInput& input);

} // namespace groundsill

#pragma once
// The response of modes to footfall by CCIP-016: Willford and Young, A Design Guide for Footfall Induced Vibration of
// Structures, The Concrete Centre, 2006, Table 4.3 and sections 4.3 and 4.4 (from memory). Internal to the screening.

#include <array>
#include <complex>
#include <optional>
#include <span>
#include <vector>

namespace groundsill {

inline constexpr int harmonic_count = 4;

/// A mode that the walker excites.
struct WalkedMode {
    int number = 0;       ///< in the model, from 1
    double frequency = 0; ///< f_m, Hz
    double mass = 0;      ///< modal mass, kg
    double shape = 0;     ///< mu at walker and receiver, both at the same place
};

struct Walk {
    double weight = 0;             ///< P, N
    double damping = 0;            ///< zeta
    std::optional<double> strides; ///< length of the walk over that of a stride, L/l; absent: full build-up
};

/// Design force coefficient alpha_h for the h-th harmonic (1 to 4) of frequency f = h f_w, Hz: 25 % chance of
/// exceedance.
double force_coefficient(int harmonic, double frequency);

/// Peak acceleration of response factor 1 in resonant response, m/s2: sqrt 2 times the base curve of ISO 10137, rounded
/// as in the guide: 0.0141/sqrt f below 4 Hz, 0.0071 to 8 Hz, 2.82 pi f 1e-4 above.
double base_acceleration(double frequency);

/// Velocity of response factor 1 in impulsive response, rms m/s: 1e-4 above 8 Hz, 5e-3/(2 pi f) below.
double base_velocity(double frequency);

/// Effective impulse for design, N s: 54 f_w^1.43/f_n^1.3.
double effective_impulse(double pace, double frequency);

struct ModeTerm {
    double A = 0;                      ///< 1 - (h f_w/f_m)^2
    double B = 0;                      ///< 2 zeta h f_w/f_m
    std::complex<double> acceleration; ///< m/s2
};

struct HarmonicResponse {
    double frequency = 0;   ///< h f_w, Hz
    double coefficient = 0; ///< alpha_h
    double force = 0;       ///< F_h, N
    double build_up = 1;    ///< rho_h
    std::vector<ModeTerm> modes;
    double acceleration = 0; ///< |a_h|, m/s2
    double base = 0;         ///< a_R=1, m/s2
    double factor = 0;       ///< R_h
};

struct ResonantResponse {
    std::array<HarmonicResponse, harmonic_count> harmonics;
    double factor = 0; ///< R, root of the sum of squares
};

/// Steady response of the modes to each harmonic of one pace, Hz.
/// a_h = sum over modes of (h f_w/f_m)^2 F_h mu^2 rho_h/m (A + iB)/(A^2 + B^2).
ResonantResponse resonant_response(std::span<const WalkedMode> modes, const Walk& walk, double pace);

struct ImpulsiveResponse {
    std::vector<double> impulses;   ///< I_eff by mode, N s
    std::vector<double> velocities; ///< v by mode, peak, m/s
    double rms = 0;                 ///< of the sum of the modes over one footfall period, m/s
    double base = 0;                ///< v_R=1 at the lowest of the modes, m/s
    double factor = 0;              ///< R
};

/// Free vibration of the modes (at least one, rising) after one footfall, v(t) = sum of v exp(-zeta w t) sin(w_d t), at
/// one pace, Hz.
ImpulsiveResponse impulsive_response(std::span<const WalkedMode> modes, const Walk& walk, double pace);

} // namespace groundsill

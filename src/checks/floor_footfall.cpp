#include "checks/floor_footfall.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>

namespace groundsill {
namespace {

const double pi = std::acos(-1.0);

/// rho_h = 1 - exp(-2 pi zeta N), N = 0.55 h L/l cycles of the harmonic.
double build_up(int harmonic, const Walk& walk) {
    if (!walk.strides) return 1;
    const double cycles = 0.55 * harmonic * *walk.strides;
    return 1 - std::exp(-2 * pi * walk.damping * cycles);
}

ModeTerm mode_term(const WalkedMode& mode, double damping, const HarmonicResponse& harmonic) {
    const double ratio = harmonic.frequency / mode.frequency;
    ModeTerm term;
    term.A = 1 - ratio * ratio;
    term.B = 2 * damping * ratio;
    const double amplitude = ratio * ratio * harmonic.force * mode.shape * mode.shape * harmonic.build_up / mode.mass;
    term.acceleration = amplitude * std::complex(term.A, term.B) / (term.A * term.A + term.B * term.B);
    return term;
}

HarmonicResponse harmonic_response(std::span<const WalkedMode> modes, const Walk& walk, double pace, int number) {
    HarmonicResponse harmonic;
    harmonic.frequency = number * pace;
    harmonic.coefficient = force_coefficient(number, harmonic.frequency);
    harmonic.force = harmonic.coefficient * walk.weight;
    harmonic.build_up = build_up(number, walk);
    std::complex<double> sum;
    for (const WalkedMode& mode : modes) {
        harmonic.modes.push_back(mode_term(mode, walk.damping, harmonic));
        sum += harmonic.modes.back().acceleration;
    }
    harmonic.acceleration = std::abs(sum);
    harmonic.base = base_acceleration(harmonic.frequency);
    harmonic.factor = harmonic.acceleration / harmonic.base;
    return harmonic;
}

/// -zeta w + i w_d of a mode: its free vibration is the imaginary part of exp of this times t.
std::complex<double> decay(const WalkedMode& mode, double damping) {
    const double w = 2 * pi * mode.frequency;
    return {-damping * w, w * std::sqrt(1 - damping * damping)};
}

/// Integral of exp(s t) from 0 to T; s is never 0, as the modes are damped.
std::complex<double> integral(std::complex<double> s, double T) { return (std::exp(s * T) - 1.0) / s; }

/// Mean square over T of the sum of the modes, exactly: Im a Im b = Re(a conj b - a b)/2.
double mean_square(std::span<const WalkedMode> modes, const std::vector<double>& velocities, double damping, double T) {
    double sum = 0;
    for (std::size_t j = 0; j < modes.size(); ++j) {
        for (std::size_t k = 0; k < modes.size(); ++k) {
            const auto a = decay(modes[j], damping);
            const auto b = decay(modes[k], damping);
            const auto product = integral(a + std::conj(b), T) - integral(a + b, T);
            sum += velocities[j] * velocities[k] * product.real() / 2;
        }
    }
    return sum / T;
}

} // namespace

double force_coefficient(int harmonic, double f) {
    switch (harmonic) {
    case 1:
        return std::clamp(0.41 * (f - 0.95), 0.0, 0.56);
    case 2:
        return 0.069 + 0.0056 * f;
    case 3:
        return 0.033 + 0.0064 * f;
    default:
        return 0.013 + 0.0065 * f;
    }
}

double base_acceleration(double f) {
    if (f < 4) return 0.0141 / std::sqrt(f);
    if (f <= 8) return 0.0071;
    return 2.82 * pi * f * 1e-4;
}

double base_velocity(double f) { return f > 8 ? 1e-4 : 5e-3 / (2 * pi * f); }

double effective_impulse(double pace, double frequency) { return 54 * std::pow(pace, 1.43) / std::pow(frequency, 1.3); }

ResonantResponse resonant_response(std::span<const WalkedMode> modes, const Walk& walk, double pace) {
    ResonantResponse response;
    double squares = 0;
    for (int h = 1; h <= harmonic_count; ++h) {
        HarmonicResponse& harmonic = response.harmonics[static_cast<std::size_t>(h - 1)];
        harmonic = harmonic_response(modes, walk, pace, h);
        squares += harmonic.factor * harmonic.factor;
    }
    response.factor = std::sqrt(squares);
    return response;
}

ImpulsiveResponse impulsive_response(std::span<const WalkedMode> modes, const Walk& walk, double pace) {
    ImpulsiveResponse response;
    for (const WalkedMode& mode : modes) {
        const double impulse = effective_impulse(pace, mode.frequency);
        response.impulses.push_back(impulse);
        response.velocities.push_back(mode.shape * mode.shape * impulse / mode.mass);
    }
    response.rms = std::sqrt(std::max(0.0, mean_square(modes, response.velocities, walk.damping, 1 / pace)));
    response.base = base_velocity(modes.front().frequency);
    response.factor = response.rms / response.base;
    return response;
}

} // namespace groundsill

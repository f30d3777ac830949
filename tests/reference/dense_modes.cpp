#include "dense_modes.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>

#include <Eigen/Cholesky>
#include <Eigen/Eigenvalues>

namespace reference {

namespace {

constexpr double gravity = 9.80665;

std::size_t index(int i) { return static_cast<std::size_t>(i); }

/// A polynomial of z from -1 to 1, lowest power first.
using Polynomial = std::vector<double>;

double value(const Polynomial& p, double z) {
    double sum = 0;
    for (std::size_t i = p.size(); i-- > 0;) sum = sum * z + p[i];
    return sum;
}

Polynomial product(const Polynomial& a, const Polynomial& b) {
    Polynomial result(a.size() + b.size() - 1, 0);
    for (std::size_t i = 0; i < a.size(); ++i)
        for (std::size_t j = 0; j < b.size(); ++j) result[i + j] += a[i] * b[j];
    return result;
}

Polynomial derivative(const Polynomial& p, double factor) {
    Polynomial result;
    for (std::size_t i = 1; i < p.size(); ++i) result.push_back(factor * static_cast<double>(i) * p[i]);
    return result;
}

Polynomial legendre(int degree) {
    Polynomial before{1}, here{0, 1};
    if (degree == 0) return before;
    for (int n = 1; n < degree; ++n) {
        Polynomial next = product({0, (2.0 * n + 1) / (n + 1)}, here);
        for (std::size_t i = 0; i < before.size(); ++i) next[i] -= before[i] * n / (n + 1.0);
        before = std::move(here);
        here = std::move(next);
    }
    return here;
}

struct GaussPoint {
    double z, weight;
};

/// Gauss-Legendre points: the roots of a Legendre polynomial by Newton's method.
const std::vector<GaussPoint>& gauss_points() {
    static const std::vector<GaussPoint> points = [] {
        constexpr int n = 24;
        std::vector<GaussPoint> result;
        for (int i = 1; i <= n; ++i) {
            double z = std::cos(std::numbers::pi * (i - 0.25) / (n + 0.5)), slope = 1;
            for (int step = 0; step < 20; ++step) {
                double before = 1, here = z;
                for (int k = 1; k < n; ++k) {
                    const double next = ((2 * k + 1) * z * here - k * before) / (k + 1);
                    before = here;
                    here = next;
                }
                slope = n * (before - z * here) / (1 - z * z);
                z -= here / slope;
            }
            result.push_back({z, 2 / ((1 - z * z) * slope * slope)});
        }
        return result;
    }();
    return points;
}

/// One movement of a part: along, across and rotation.
struct Shape {
    Polynomial u, w, r;
};

/// The shapes of a part of length h: the six of its ends (along, across, rotation; start, then end), then bubbles.
std::vector<Shape> shapes_of(double h, bool shear_flexible, int along, int across) {
    const Polynomial left{0.5, -0.5}, right{0.5, 0.5}, bubble{1, 0, -1};
    std::vector<Shape> shapes{{left, {}, {}}, {}, {}, {right, {}, {}}, {}, {}};
    for (int k = 0; k < along; ++k) shapes.push_back({product(bubble, legendre(k)), {}, {}});
    if (shear_flexible) {
        shapes[1].w = shapes[2].r = left;
        shapes[4].w = shapes[5].r = right;
        for (int k = 0; k <= across; ++k) {
            shapes.push_back({{}, product(bubble, legendre(k)), {}});
            shapes.push_back({{}, {}, product(bubble, legendre(k))});
        }
        return shapes;
    }
    const double q = h / 8;
    shapes[1].w = {0.5, -0.75, 0, 0.25};
    shapes[2].w = {q, -q, -q, q};
    shapes[4].w = {0.5, 0.75, 0, -0.25};
    shapes[5].w = {-q, -q, q, q};
    for (int k = 0; k < across; ++k) shapes.push_back({{}, product(product(bubble, bubble), legendre(k)), {}});
    for (Shape& shape : shapes) shape.r = derivative(shape.w, 2 / h);
    return shapes;
}

/// Mass along a member, linear from a to b, kg/m.
struct Line {
    double a, b, from, to;
};
struct Point {
    double at, mass;
};

/// All mass on one member.
struct MemberMass {
    std::vector<Line> lines;
    std::vector<Point> points;
    double rotary = 0; ///< kg m
};

/// The part of a line above 0.
void add_line(Line line, MemberMass& mass) {
    if (line.from < 0 && line.to < 0) return;
    if (line.from * line.to < 0) {
        const double zero = line.a + (line.b - line.a) * line.from / (line.from - line.to);
        line = line.from < 0 ? Line{zero, line.b, 0, line.to} : Line{line.a, zero, line.from, 0};
    }
    mass.lines.push_back(line);
}

class Assembly {
  public:
    Assembly(const Frame& frame, const Masses& masses, int more) : frame_(frame), masses_(masses), more_(more) {
        number_nodes();
        for (int i = 0; i < static_cast<int>(frame_.members.size()); ++i) add_member(i);
        for (const auto& [load_case, factor] : masses_.cases)
            for (const Load& load : frame_.cases[index(load_case)].loads)
                if (load.kind == Load::Kind::node) add_node_mass(load.on, -factor * load.second_a / gravity);
        for (const auto& [node, mass] : masses_.nodes) add_node_mass(node, mass);
        add_support_springs();
    }

    std::vector<DenseMode> solve(int count) const;

  private:
    /// A movement as a sum of unknowns.
    using Sum = std::vector<std::pair<int, double>>;
    struct Entry {
        int row, column;
        double value;
    };

    int new_unknown() { return unknowns_++; }

    const Support* support_at(int node) const {
        for (const Support& support : frame_.supports)
            if (support.node == node) return &support;
        return nullptr;
    }

    static Sum combination(double a, const Sum& first, double b, const Sum& second) {
        Sum result;
        for (const auto& [unknown, factor] : first) result.push_back({unknown, a * factor});
        for (const auto& [unknown, factor] : second) result.push_back({unknown, b * factor});
        return result;
    }

    /// Unknowns are movements in the support's axes, where the node has one; held ones are none.
    void number_nodes() {
        for (int node = 0; node < static_cast<int>(frame_.nodes.size()); ++node) {
            const Support* support = support_at(node);
            std::array<Sum, 3> own;
            for (int k = 0; k < 3; ++k) {
                const bool held = support != nullptr && joint(support->held, k).kind == Joint::Kind::rigid;
                if (!held) own[index(k)] = {{new_unknown(), 1}};
            }
            own_.push_back(own);
            const double angle = support == nullptr ? 0 : support->angle;
            const double c = std::cos(angle), s = std::sin(angle);
            global_.push_back({combination(c, own[0], -s, own[1]), combination(s, own[0], c, own[1]), own[2]});
        }
    }

    static const Joint& joint(const Joints& joints, int k) {
        return k == 0 ? joints.first : k == 1 ? joints.second : joints.rotation;
    }

    void add(std::vector<Entry>& matrix, const Sum& row, const Sum& column, double size) {
        for (const auto& [i, a] : row)
            for (const auto& [j, b] : column) matrix.push_back({i, j, a * b * size});
    }

    void add_spring(const Sum& movement, double stiffness) { add(stiffness_, movement, movement, stiffness); }

    void add_support_springs() {
        for (const Support& support : frame_.supports)
            for (int k = 0; k < 3; ++k)
                if (joint(support.held, k).kind == Joint::Kind::spring)
                    add_spring(own_[index(support.node)][index(k)], joint(support.held, k).stiffness);
    }

    void pull(const Sum& movement, double along_x, double along_y) {
        for (const auto& [i, a] : movement) pulls_.push_back({i, a * along_x, a * along_y});
    }

    void add_node_mass(int node, double mass) {
        if (mass <= 0) return;
        const std::array<Sum, 3>& movement = global_[index(node)];
        for (int k = 0; k < 2; ++k) add(mass_, movement[index(k)], movement[index(k)], mass);
        pull(movement[0], mass, 0);
        pull(movement[1], 0, mass);
    }

    /// Downward part of a force in global or member axes, over g.
    double downward(const Load& load, double first, double second, double c, double s) const {
        return load.axes == Load::Axes::member ? -(s * first + c * second) / gravity : -second / gravity;
    }

    MemberMass mass_of(int member) const {
        const Member& m = frame_.members[index(member)];
        const Node &from = frame_.nodes[index(m.from)], &to = frame_.nodes[index(m.to)];
        const double length = member_length(frame_, member);
        const double c = (to.x - from.x) / length, s = (to.y - from.y) / length;
        const Section& section = frame_.sections[index(m.section)];
        const double density = frame_.materials[index(m.material)].density;
        MemberMass mass;
        for (const auto& [load_case, factor] : masses_.cases)
            for (const Load& load : frame_.cases[index(load_case)].loads) {
                if (load.kind == Load::Kind::self_weight) {
                    const double line = factor * load.amount * density * section.A;
                    add_line({0, length, line, line}, mass);
                    if (section.shear_area > 0) mass.rotary += factor * load.amount * density * section.I;
                }
                if (load.on != member) continue;
                if (load.kind == Load::Kind::point) {
                    const double kg = factor * downward(load, load.first_a, load.second_a, c, s);
                    if (kg > 0) mass.points.push_back({load.a, kg});
                }
                if (load.kind != Load::Kind::distributed) continue;
                const double times = factor * (load.axes == Load::Axes::plan ? std::abs(c) : 1);
                add_line({load.whole ? 0 : load.a, load.whole ? length : load.b,
                          times * downward(load, load.first_a, load.second_a, c, s),
                          times * downward(load, load.first_b, load.second_b, c, s)},
                         mass);
            }
        return mass;
    }

    /// The movement of a member's end, each part the node's or its own.
    Sum end_movement(const Joints& joints, int node, int k, double c, double s) {
        const std::array<Sum, 3>& global = global_[index(node)];
        const Sum of_node = k == 0   ? combination(c, global[0], s, global[1])
                            : k == 1 ? combination(-s, global[0], c, global[1])
                                     : global[2];
        const Joint& held = joint(joints, k);
        if (held.kind == Joint::Kind::rigid) return of_node;
        const Sum own{{new_unknown(), 1}};
        if (held.kind == Joint::Kind::spring) add_spring(combination(1, own, -1, of_node), held.stiffness);
        return own;
    }

    /// Where a member is cut: its ends, hinges, and wherever its mass changes.
    static std::vector<double> stations(double length, const std::vector<double>& hinges, const MemberMass& mass) {
        std::vector<double> all{0, length};
        all.insert(all.end(), hinges.begin(), hinges.end());
        for (const Line& line : mass.lines) all.insert(all.end(), {line.a, line.b});
        for (const Point& point : mass.points) all.push_back(point.at);
        std::ranges::sort(all);
        const auto same = [length](double a, double b) { return b - a < 1e-9 * length; };
        all.erase(std::unique(all.begin(), all.end(), same), all.end());
        return all;
    }

    void add_member(int member) {
        const Member& m = frame_.members[index(member)];
        const Node &from = frame_.nodes[index(m.from)], &to = frame_.nodes[index(m.to)];
        const double length = member_length(frame_, member);
        const double c = (to.x - from.x) / length, s = (to.y - from.y) / length;
        const MemberMass mass = mass_of(member);
        const std::vector<double> places = stations(length, m.hinges, mass);
        const auto near = [length](double a, double b) { return std::abs(a - b) < 1e-9 * length; };
        std::array<Sum, 3> start;
        for (int k = 0; k < 3; ++k) start[index(k)] = end_movement(m.start, m.from, k, c, s);
        for (std::size_t i = 0; i + 1 < places.size(); ++i) {
            std::array<Sum, 3> end;
            for (int k = 0; k < 3; ++k)
                end[index(k)] = i + 2 == places.size() ? end_movement(m.end, m.to, k, c, s) : Sum{{new_unknown(), 1}};
            if (i == 0) add_points(mass, 0, start, c, s, near);
            add_points(mass, places[i + 1], end, c, s, near);
            add_part(m, mass, places[i], places[i + 1], {start[0], start[1], start[2], end[0], end[1], end[2]}, c, s);
            start = end;
            const auto hinged = [&](double hinge) { return near(hinge, places[i + 1]); };
            if (std::ranges::any_of(m.hinges, hinged)) start[2] = {{new_unknown(), 1}};
        }
    }

    void add_points(const MemberMass& mass, double at, const std::array<Sum, 3>& movement, double c, double s,
                    const auto& near) {
        for (const Point& point : mass.points) {
            if (!near(point.at, at)) continue;
            for (int k = 0; k < 2; ++k) add(mass_, movement[index(k)], movement[index(k)], point.mass);
            pull(movement[0], point.mass * c, point.mass * s);
            pull(movement[1], -point.mass * s, point.mass * c);
        }
    }

    /// Degrees follow the number of waves that a part may hold: few, where the frame has many members.
    void add_part(const Member& m, const MemberMass& mass, double a, double b, std::vector<Sum> movements, double c,
                  double s) {
        const bool simple = frame_.members.size() <= 3;
        const double h = b - a;
        const int across = more_ + (h < 0.7 ? 4 : h < 2.5 ? 6 : simple ? 12 : 9);
        const int along = more_ + (h < 0.7 ? 3 : h < 2.5 ? 5 : simple ? 10 : 7);
        const Section& section = frame_.sections[index(m.section)];
        const Material& material = frame_.materials[index(m.material)];
        const bool shear_flexible = section.shear_area > 0;
        const std::vector<Shape> shapes = shapes_of(h, shear_flexible, along, across);
        while (movements.size() < shapes.size()) movements.push_back({{new_unknown(), 1}});
        const double EA = m.factor * material.E * section.A, EI = m.factor * material.E * section.I;
        const double GA = m.factor * material.G * section.shear_area;
        const auto line_mass = [&](double place) {
            double sum = 0;
            for (const Line& line : mass.lines)
                if (place > line.a && place < line.b)
                    sum += line.from + (line.to - line.from) * (place - line.a) / (line.b - line.a);
            return sum;
        };
        const auto n = static_cast<Eigen::Index>(shapes.size());
        Eigen::MatrixXd K = Eigen::MatrixXd::Zero(n, n), M = K;
        Eigen::VectorXd along_pull = Eigen::VectorXd::Zero(n), across_pull = along_pull;
        for (const GaussPoint& point : gauss_points()) {
            Eigen::VectorXd u(n), w(n), r(n), strain(n), curvature(n), shear(n);
            for (Eigen::Index i = 0; i < n; ++i) {
                const Shape& shape = shapes[static_cast<std::size_t>(i)];
                u[i] = value(shape.u, point.z);
                w[i] = value(shape.w, point.z);
                r[i] = value(shape.r, point.z);
                strain[i] = value(derivative(shape.u, 2 / h), point.z);
                curvature[i] = value(derivative(shape.r, 2 / h), point.z);
                shear[i] = value(derivative(shape.w, 2 / h), point.z) - r[i];
            }
            const double ds = point.weight * h / 2, dm = line_mass(a + h * (1 + point.z) / 2) * ds;
            K += ds * (EA * strain * strain.transpose() + EI * curvature * curvature.transpose());
            if (shear_flexible) K += ds * GA * shear * shear.transpose();
            M += dm * (u * u.transpose() + w * w.transpose()) + mass.rotary * ds * r * r.transpose();
            along_pull += dm * u;
            across_pull += dm * w;
        }
        for (Eigen::Index i = 0; i < n; ++i) {
            const Sum& row = movements[static_cast<std::size_t>(i)];
            pull(row, along_pull[i] * c - across_pull[i] * s, along_pull[i] * s + across_pull[i] * c);
            for (Eigen::Index j = 0; j < n; ++j) {
                const Sum& column = movements[static_cast<std::size_t>(j)];
                if (K(i, j) != 0) add(stiffness_, row, column, K(i, j));
                if (M(i, j) != 0) add(mass_, row, column, M(i, j));
            }
        }
    }

    struct Pull {
        int row;
        double x, y;
    };

    const Frame& frame_;
    const Masses& masses_;
    int more_;
    int unknowns_ = 0;
    std::vector<std::array<Sum, 3>> own_;    // by node, in its support's axes
    std::vector<std::array<Sum, 3>> global_; // by node
    std::vector<Entry> stiffness_, mass_;
    std::vector<Pull> pulls_;
};

std::vector<DenseMode> Assembly::solve(int count) const {
    Eigen::MatrixXd K = Eigen::MatrixXd::Zero(unknowns_, unknowns_), M = K;
    Eigen::MatrixXd G = Eigen::MatrixXd::Zero(unknowns_, 2);
    for (const Entry& entry : stiffness_) K(entry.row, entry.column) += entry.value;
    for (const Entry& entry : mass_) M(entry.row, entry.column) += entry.value;
    for (const Pull& each : pulls_) {
        G(each.row, 0) += each.x;
        G(each.row, 1) += each.y;
    }
    // A node that nothing turns has no rotation: its row is empty.
    for (Eigen::Index i = 0; i < unknowns_; ++i)
        if (K(i, i) == 0) K(i, i) = 1;
    // Unknowns in the size of their stiffness, so that Cholesky and the eigenvalues lose nothing.
    const Eigen::VectorXd scale = K.diagonal().cwiseSqrt().cwiseInverse();
    K = (scale.asDiagonal() * K * scale.asDiagonal()).eval();
    M = (scale.asDiagonal() * M * scale.asDiagonal()).eval();
    G = (scale.asDiagonal() * G).eval();
    const Eigen::LLT<Eigen::MatrixXd> cholesky(K);
    const auto L = cholesky.matrixL();
    Eigen::MatrixXd A = L.solve(M);
    A = L.solve(A.transpose().eval());
    const Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd> solver((A + A.transpose()) / 2);
    const Eigen::VectorXd& mu = solver.eigenvalues(); // rising: 1/lambda
    std::vector<DenseMode> modes;
    for (Eigen::Index i = unknowns_ - 1; i >= 0 && static_cast<int>(modes.size()) < count; --i) {
        if (mu[i] < 1e-13 * mu[unknowns_ - 1]) break;
        // x = L^-T y has x' M x = mu; participation x' G.
        const Eigen::VectorXd x = cholesky.matrixU().solve(solver.eigenvectors().col(i));
        const double gx = x.dot(G.col(0)), gy = x.dot(G.col(1));
        modes.push_back({1 / (2 * std::numbers::pi * std::sqrt(mu[i])), gx * gx / mu[i], gy * gy / mu[i]});
    }
    return modes;
}

} // namespace

std::vector<DenseMode> dense_modes(const Frame& frame, const Masses& masses, int count, int more) {
    return Assembly(frame, masses, more).solve(count);
}

} // namespace reference

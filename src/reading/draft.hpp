#pragma once
// The model while it is being read, and the readers of its parts.

#include <deque>
#include <set>
#include <string>
#include <utility>

#include "groundsill/model.hpp"
#include "reading/fields.hpp"

namespace groundsill::reading {

/// The model so far, and what only reading needs. Names refer to the parsed text, which must outlive the draft.
///
/// An entity with an error stays in the model, so that others can refer to it without a second message; it is marked as
/// unsound by its place in the file.
struct Draft {
    Context context;
    Model model;
    NameIndex materials;
    NameIndex sections;
    NameIndex nodes;
    NameIndex members;
    NameIndex beams;
    NameIndex supports;
    NameIndex cases;

    void mark_unsound(Position position) { unsound_.insert({position.line, position.column}); }
    bool is_sound(Position position) const {
        return unsound_.empty() || !unsound_.contains({position.line, position.column});
    }

  private:
    std::set<std::pair<int, int>> unsound_;
};

/// The element of a list at an index of the model.
template <class List> auto& at(List& list, int index) { return list[static_cast<std::size_t>(index)]; }

void read_head(Draft& draft, const Fields& top);         ///< title, notes, [job]
void read_units(Draft& draft, const Fields& top);        ///< [units]
void read_materials(Draft& draft, const Fields& top);    ///< [materials]
void read_sections(Draft& draft, const Fields& top);     ///< [sections]
void read_geometry(Draft& draft, const Fields& top);     ///< [nodes], [members], [beams]
void read_supports(Draft& draft, const Fields& top);     ///< [supports]
void read_cases(Draft& draft, const Fields& top);        ///< [cases]
void read_combinations(Draft& draft, const Fields& top); ///< [combinations]
void read_mass(Draft& draft, const Fields& top);         ///< [mass]

/// Reads `loads` of one case.
void read_loads(Draft& draft, LoadCase& load_case, const Field& loads, const Path& case_path);

/// How a support or a release holds one direction: a word, a stiffness, or a table with one.
/// \param absent what it is when the key is not there
Restraint read_restraint(Fields& table, std::string_view key, Restraint::Kind absent);

/// The ends of a member or of all members of a beam.
struct Ends {
    Release start;
    Release end;
};
Ends read_releases(Fields& member);

/// What [members] and [beams] have in common: section, material, releases, stiffness_factor.
void read_member_properties(Draft& draft, Fields& table, Member& member);

/// Reads [beams] in two steps: a beam creates nodes, to which members may refer, before it creates its own members.
class BeamReader {
  public:
    BeamReader(Draft& draft, const Fields& top);
    ~BeamReader();
    BeamReader(const BeamReader&) = delete;
    BeamReader& operator=(const BeamReader&) = delete;

    /// Adds the nodes that stand nowhere else to the model, at its end.
    void create_nodes();
    /// Adds the members and the beams. \pre the nodes are in their final order
    void create_members();
    /// Lets the beams know their members. \pre the members are in their final order
    void find_members();

  private:
    struct Run;
    void create_nodes(Run& run);
    void check_place(Run& run, const Node& wanted, const Node& existing);
    void create_unknown_node(Run& run, const TomlNode& name);

    Draft& draft_;
    Path path_{nullptr, "beams"};
    std::vector<NamedEntry> entries_;
    std::deque<Run> runs_;
};

} // namespace groundsill::reading

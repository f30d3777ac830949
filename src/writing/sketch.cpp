// A model before anything is solved: a picture and an inventory.

#include "groundsill/writing.hpp"
#include "writing/inventory.hpp"
#include "writing/picture.hpp"
#include "writing/utf8.hpp"

namespace groundsill {

std::string sketch_text(const Model& model) {
    std::string text;
    if (!model.title.empty()) text += writing::printable(model.title) + "\n\n";
    return text + writing::picture(model) + writing::inventory(model);
}

} // namespace groundsill

#pragma once
// The whole public API: read a model, analyse it, write the results.

#include "groundsill/analysis.hpp"
#include "groundsill/diagnostics.hpp"
#include "groundsill/diagram.hpp"
#include "groundsill/model.hpp"
#include "groundsill/reading.hpp"
#include "groundsill/writing.hpp"

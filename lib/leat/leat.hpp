#pragma once

/// Everything that a program needs to state a passage and get its answer.
/// The lower rooms have their own headers, e.g. <leat/coupling/flow.hpp>.

#include <leat/base/error.hpp>
#include <leat/base/observer.hpp>
#include <leat/base/version.hpp>
#include <leat/passage/answer.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>
#include <leat/passage/solve.hpp>

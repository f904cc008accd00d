// How --help looks, of the program and of every command.
#pragma once

#include <memory>

namespace CLI {
class FormatterBase;
}

namespace irrepwise::cli {

/// Two columns that align whatever the letters ("Å" is one column wide), descriptions wrapped, a
/// blank line between groups.
[[nodiscard]] std::shared_ptr<CLI::FormatterBase> help_format();

}  // namespace irrepwise::cli

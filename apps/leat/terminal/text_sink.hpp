#pragma once

#include <stdexcept>
#include <string>
#include <string_view>

namespace leat::driver {

/// A stream did not take what was written to it.
class SinkError : public std::runtime_error {
public:
    using std::runtime_error::runtime_error;
};

/// Where text goes.
class TextSink {
public:
    virtual ~TextSink() = default;
    /// Writes all of it, at once. Throws SinkError.
    virtual void write(std::string_view text) = 0;
    /// A line may be rewritten and coloured: a terminal, NO_COLOR is unset, TERM is not dumb.
    virtual bool decorated() const { return false; }
};

/// An open file descriptor: 1 is standard output, 2 is for messages.
class DescriptorSink : public TextSink {
public:
    explicit DescriptorSink(int descriptor);
    void write(std::string_view text) override;
    bool decorated() const override { return decorated_; }

private:
    int descriptor_;
    bool decorated_;
};

/// Keeps the text.
class StringSink : public TextSink {
public:
    void write(std::string_view text) override { text_ += text; }
    const std::string& text() const { return text_; }

private:
    std::string text_;
};

} // namespace leat::driver

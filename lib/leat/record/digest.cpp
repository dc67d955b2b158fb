#include <leat/record/digest.hpp>

#include <algorithm>
#include <array>
#include <bit>
#include <cstdint>

namespace leat::record {

namespace {

using Words = std::array<std::uint32_t, 8>;
constexpr std::size_t block_size = 64;

// FIPS 180-4, section 4.2.2: fractional parts of the cube roots of the first 64 primes.
constexpr std::array<std::uint32_t, 64> round_constants = {
    0x428a2f98, 0x71374491, 0xb5c0fbcf, 0xe9b5dba5, 0x3956c25b, 0x59f111f1, 0x923f82a4, 0xab1c5ed5,
    0xd807aa98, 0x12835b01, 0x243185be, 0x550c7dc3, 0x72be5d74, 0x80deb1fe, 0x9bdc06a7, 0xc19bf174,
    0xe49b69c1, 0xefbe4786, 0x0fc19dc6, 0x240ca1cc, 0x2de92c6f, 0x4a7484aa, 0x5cb0a9dc, 0x76f988da,
    0x983e5152, 0xa831c66d, 0xb00327c8, 0xbf597fc7, 0xc6e00bf3, 0xd5a79147, 0x06ca6351, 0x14292967,
    0x27b70a85, 0x2e1b2138, 0x4d2c6dfc, 0x53380d13, 0x650a7354, 0x766a0abb, 0x81c2c92e, 0x92722c85,
    0xa2bfe8a1, 0xa81a664b, 0xc24b8b70, 0xc76c51a3, 0xd192e819, 0xd6990624, 0xf40e3585, 0x106aa070,
    0x19a4c116, 0x1e376c08, 0x2748774c, 0x34b0bcb5, 0x391c0cb3, 0x4ed8aa4a, 0x5b9cca4f, 0x682e6ff3,
    0x748f82ee, 0x78a5636f, 0x84c87814, 0x8cc70208, 0x90befffa, 0xa4506ceb, 0xbef9a3f7, 0xc67178f2};

std::uint32_t big_endian_word(const std::byte* bytes)
{
    std::uint32_t word = 0;
    for (int k = 0; k < 4; ++k) {
        word = (word << 8) | std::to_integer<std::uint32_t>(bytes[k]);
    }
    return word;
}

// FIPS 180-4, section 6.2.2.
void take_block(Words& state, const std::byte* block)
{
    std::array<std::uint32_t, 64> schedule{};
    for (std::size_t t = 0; t < 16; ++t) {
        schedule[t] = big_endian_word(block + 4 * t);
    }
    for (std::size_t t = 16; t < 64; ++t) {
        const std::uint32_t near = schedule[t - 2];
        const std::uint32_t far = schedule[t - 15];
        schedule[t] = (std::rotr(near, 17) ^ std::rotr(near, 19) ^ (near >> 10)) + schedule[t - 7] +
                      (std::rotr(far, 7) ^ std::rotr(far, 18) ^ (far >> 3)) + schedule[t - 16];
    }
    auto [a, b, c, d, e, f, g, h] = state;
    for (std::size_t t = 0; t < 64; ++t) {
        const std::uint32_t first = h + (std::rotr(e, 6) ^ std::rotr(e, 11) ^ std::rotr(e, 25)) + ((e & f) ^ (~e & g)) +
                                    round_constants[t] + schedule[t];
        const std::uint32_t second =
            (std::rotr(a, 2) ^ std::rotr(a, 13) ^ std::rotr(a, 22)) + ((a & b) ^ (a & c) ^ (b & c));
        h = g;
        g = f;
        f = e;
        e = d + first;
        d = c;
        c = b;
        b = a;
        a = first + second;
    }
    const Words change = {a, b, c, d, e, f, g, h};
    for (std::size_t k = 0; k < state.size(); ++k) {
        state[k] += change[k];
    }
}

} // namespace

std::string sha256(std::span<const std::byte> bytes)
{
    // FIPS 180-4, section 5.3.3: fractional parts of the square roots of the first 8 primes.
    Words state = {0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19};
    const std::size_t whole = bytes.size() / block_size * block_size;
    for (std::size_t at = 0; at < whole; at += block_size) {
        take_block(state, bytes.data() + at);
    }
    // Section 5.1.1: a one bit, zeros, the length in bits as 64-bit big-endian number.
    std::array<std::byte, 2 * block_size> tail{};
    const std::size_t rest = bytes.size() - whole;
    std::copy_n(bytes.begin() + static_cast<std::ptrdiff_t>(whole), rest, tail.begin());
    tail[rest] = std::byte{0x80};
    const std::size_t padded = rest + 9 <= block_size ? block_size : 2 * block_size;
    const std::uint64_t bits = std::uint64_t{bytes.size()} * 8;
    for (std::size_t k = 0; k < 8; ++k) {
        tail[padded - 1 - k] = static_cast<std::byte>((bits >> (8 * k)) & 0xff);
    }
    for (std::size_t at = 0; at < padded; at += block_size) {
        take_block(state, tail.data() + at);
    }
    std::string digits;
    for (const std::uint32_t word : state) {
        for (int shift = 28; shift >= 0; shift -= 4) {
            digits += "0123456789abcdef"[(word >> shift) & 0xf];
        }
    }
    return digits;
}

} // namespace leat::record

// What a foreign program does with leat: one call of the main road, one of the result files (which need HDF5).
#include <leat/leat.hpp>
#include <leat/record/result.hpp>

#include <iostream>

int main(int argument_count, char** arguments)
{
    try {
        leat::solve(leat::Passage{});
        return 1; // a passage without any dimension was solved
    } catch (const leat::InvalidInput&) {
    }
    if (argument_count > 1) {
        leat::record::check_writable(arguments[1], "foreign", false);
    }
    std::cout << "leat " << leat::version() << '\n';
}

/// The command line from outside the tree: links every floor and what they stand on.
#include "cases/command/run.hpp"

int main(int argc, char** argv) { return ringwright::cases::run(argc, argv); }

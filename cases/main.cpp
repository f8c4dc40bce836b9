#include "cases/command/run.hpp"

int main(int argc, char** argv) { return ringwright::cases::run(argc, argv); }

# Every header compiles alone: one source file per header, which includes it twice and nothing else.
set(floors models solver postprocess cases)
list(TRANSFORM floors REPLACE "(.+)" "${CMAKE_SOURCE_DIR}/\\1/*.hpp" OUTPUT_VARIABLE patterns)
file(GLOB_RECURSE headers RELATIVE ${CMAKE_SOURCE_DIR} CONFIGURE_DEPENDS ${patterns})

set(sources)
foreach(header IN LISTS headers)
  set(source ${CMAKE_CURRENT_BINARY_DIR}/headers_alone/${header}.cpp)
  file(CONFIGURE OUTPUT ${source} CONTENT "#include \"@header@\"\n#include \"@header@\"\n" @ONLY)
  list(APPEND sources ${source})
endforeach()

add_library(headers_alone OBJECT ${sources})
target_include_directories(headers_alone PRIVATE ${CMAKE_SOURCE_DIR})
target_include_directories(headers_alone SYSTEM PRIVATE ${Boost_INCLUDE_DIRS})
target_compile_options(headers_alone PRIVATE -O0)
target_link_libraries(headers_alone PRIVATE ringwright_flags
  Eigen3::Eigen SUNDIALS::ida SUNDIALS::nvecserial KLU::KLU HDF5::HDF5 nlohmann_json::nlohmann_json
  fmt::fmt OpenSSL::Crypto yaml-cpp UDUNITS2::UDUNITS2 CLI11::CLI11 Threads::Threads)

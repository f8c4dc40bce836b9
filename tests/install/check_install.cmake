# Installs the build to an empty folder, then configures, builds and runs a small program that
# knows nothing but that folder.
#   cmake -D BUILD_DIR=... -D WORK_DIR=... -D CONFIG=... -P check_install.cmake
function(run)
  execute_process(COMMAND ${ARGN} COMMAND_ERROR_IS_FATAL ANY)
endfunction()

file(REMOVE_RECURSE ${WORK_DIR})
run(${CMAKE_COMMAND} --install ${BUILD_DIR} --prefix ${WORK_DIR}/prefix --config ${CONFIG})
run(${CMAKE_COMMAND} -S ${CMAKE_CURRENT_LIST_DIR}/consumer -B ${WORK_DIR}/build
  -D CMAKE_BUILD_TYPE=Debug -D CMAKE_PREFIX_PATH=${WORK_DIR}/prefix)
run(${CMAKE_COMMAND} --build ${WORK_DIR}/build)
run(${WORK_DIR}/build/one_ring)
run(${WORK_DIR}/build/whole_program info)
run(${WORK_DIR}/prefix/bin/ringwright info)
file(REMOVE_RECURSE ${WORK_DIR})

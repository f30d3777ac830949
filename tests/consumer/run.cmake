# Installs the build in BUILD into an empty prefix, builds the project in this folder against it and runs both programs.
# Blanks in the paths are meant: nothing may trip over them.
cmake_minimum_required(VERSION 3.25)

set(work "${BUILD}/consumer test")
set(prefix "${work}/installed here")

function(run)
  execute_process(COMMAND ${ARGN} COMMAND_ECHO STDOUT COMMAND_ERROR_IS_FATAL ANY)
endfunction()

file(REMOVE_RECURSE "${work}")
run("${CMAKE_COMMAND}" --install "${BUILD}" --prefix "${prefix}" --config "${CONFIG}")
# The package must work where the libraries that groundsill was built with cannot be found.
run("${CMAKE_COMMAND}" -S "${CMAKE_CURRENT_LIST_DIR}" -B "${work}/build" -G "${GENERATOR}"
    "-DCMAKE_PREFIX_PATH=${prefix}" "-DCMAKE_CXX_COMPILER=${COMPILER}" "-DCMAKE_BUILD_TYPE=${CONFIG}"
    "-DCMAKE_CXX_FLAGS=${FLAGS}" -DCMAKE_DISABLE_FIND_PACKAGE_Eigen3=TRUE -DCMAKE_DISABLE_FIND_PACKAGE_fmt=TRUE
    -DCMAKE_DISABLE_FIND_PACKAGE_tomlplusplus=TRUE)
run("${CMAKE_COMMAND}" --build "${work}/build" --config "${CONFIG}")
run("${work}/build/consumer")
run("${prefix}/${BINDIR}/groundsill" --version)

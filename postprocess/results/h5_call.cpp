#include "postprocess/results/h5_call.hpp"

namespace ringwright::postprocess {
namespace {

herr_t keep_first(unsigned position, const H5E_error2_t* error, void* text) {
  if (position == 0 && error->desc != nullptr) *static_cast<std::string*>(text) = error->desc;
  return 0;
}

}  // namespace

std::mutex& H5Access::mutex() {
  static std::mutex only;
  return only;
}

H5Access::H5Access() : lock_(mutex()) {
  H5Eget_auto2(H5E_DEFAULT, &printer_, &printer_data_);
  H5Eset_auto2(H5E_DEFAULT, nullptr, nullptr);
}

H5Access::~H5Access() { H5Eset_auto2(H5E_DEFAULT, printer_, printer_data_); }

std::string H5Access::message() {
  std::string text = "no reason given";
  H5Ewalk2(H5E_DEFAULT, H5E_WALK_UPWARD, &keep_first, &text);
  return text;
}

}  // namespace ringwright::postprocess

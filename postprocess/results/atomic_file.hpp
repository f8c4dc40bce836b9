#pragma once
/// Files that are either complete or not there.
///
/// The content goes to `<name>.part`, is pushed to the disk and only then takes the final name, so
/// that neither an interrupt nor a full disk leaves a half-written result under a name somebody
/// trusts. Several files that belong together are written as parts first and named at the end.

#include <filesystem>
#include <stdexcept>
#include <string>
#include <string_view>

namespace ringwright::postprocess {

/// A result file could not be written.
class ResultFileError : public std::runtime_error {
 public:
  ResultFileError(std::filesystem::path path, std::string cause);

  const std::filesystem::path& path() const { return path_; }  ///< the file that was wanted
  const std::string& cause() const { return cause_; }          ///< what the system said

 private:
  std::filesystem::path path_;
  std::string cause_;
};

/// A file complete on the disk, but still under the name `<target>.part`.
class PartFile {
 public:
  /// Writes the content and waits until the disk has it. An old part of the same name is replaced.
  /// @throws ResultFileError when that fails; nothing is left behind then
  PartFile(std::filesystem::path target, std::string_view content);
  PartFile(const PartFile&) = delete;
  PartFile& operator=(const PartFile&) = delete;
  PartFile(PartFile&& other) noexcept;
  PartFile& operator=(PartFile&&) = delete;
  /// Removes the part if it was not given its name.
  ~PartFile();

  /// Gives the file its final name, replacing an older file.
  /// @throws ResultFileError when that fails; the older file is untouched then
  void commit();

 private:
  std::filesystem::path target_;
  std::filesystem::path part_;
  bool pending_ = true;  ///< the part is ours to remove
};

/// Writes one file by way of its part.
/// @throws ResultFileError when that fails; neither file nor part is left behind, and an older file
///         is untouched
void write_atomically(const std::filesystem::path& target, std::string_view content);

}  // namespace ringwright::postprocess

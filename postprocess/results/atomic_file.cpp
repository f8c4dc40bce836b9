#include "postprocess/results/atomic_file.hpp"

#include <fcntl.h>
#include <unistd.h>

#include <cerrno>
#include <system_error>
#include <utility>

namespace ringwright::postprocess {
namespace {

std::string system_message(int error) { return std::generic_category().message(error); }

/// An open file of the operating system.
class Descriptor {
 public:
  explicit Descriptor(int number) : number_(number) {}
  Descriptor(const Descriptor&) = delete;
  Descriptor& operator=(const Descriptor&) = delete;
  ~Descriptor() {
    if (number_ >= 0) ::close(number_);
  }

  bool is_open() const { return number_ >= 0; }
  int number() const { return number_; }
  /// 0 or the error number. Some file systems report a failed write only here.
  int close() { return ::close(std::exchange(number_, -1)) == 0 ? 0 : errno; }

 private:
  int number_;
};

/// 0 or the error number.
int write_all(int number, std::string_view content) {
  while (!content.empty()) {
    const ssize_t written = ::write(number, content.data(), content.size());
    if (written < 0) {
      if (errno == EINTR) continue;
      return errno;
    }
    content.remove_prefix(static_cast<std::size_t>(written));
  }
  return 0;
}

/// 0 or the error number.
int sync_to_disk(int number) { return ::fsync(number) == 0 ? 0 : errno; }

/// Makes a new name survive a power cut. Not every file system can; the file itself is safe by now,
/// so a refusal is no error.
void sync_folder(const std::filesystem::path& folder) {
  const Descriptor directory(
      ::open(folder.empty() ? "." : folder.c_str(), O_RDONLY | O_DIRECTORY | O_CLOEXEC));
  if (directory.is_open()) ::fsync(directory.number());
}

std::filesystem::path part_of(const std::filesystem::path& target) {
  std::filesystem::path part = target;
  part += ".part";
  return part;
}

}  // namespace

ResultFileError::ResultFileError(std::filesystem::path path, std::string cause)
    : std::runtime_error("cannot write " + path.string() + ": " + cause),
      path_(std::move(path)),
      cause_(std::move(cause)) {}

PartFile::PartFile(std::filesystem::path target, std::string_view content)
    : target_(std::move(target)), part_(part_of(target_)) {
  std::error_code ignored;
  if (std::filesystem::is_directory(target_, ignored)) {
    throw ResultFileError(target_, system_message(EISDIR));
  }
  Descriptor file(::open(part_.c_str(), O_WRONLY | O_CREAT | O_TRUNC | O_CLOEXEC, 0666));
  if (!file.is_open()) throw ResultFileError(target_, system_message(errno));
  int error = write_all(file.number(), content);
  if (error == 0) error = sync_to_disk(file.number());
  if (error == 0) error = file.close();
  if (error != 0) {
    ::unlink(part_.c_str());
    throw ResultFileError(target_, system_message(error));
  }
}

PartFile::PartFile(PartFile&& other) noexcept
    : target_(std::move(other.target_)),
      part_(std::move(other.part_)),
      pending_(std::exchange(other.pending_, false)) {}

PartFile::~PartFile() {
  if (pending_) ::unlink(part_.c_str());
}

void PartFile::commit() {
  std::error_code error;
  std::filesystem::rename(part_, target_, error);
  if (error) throw ResultFileError(target_, error.message());
  pending_ = false;
  sync_folder(target_.parent_path());
}

void write_atomically(const std::filesystem::path& target, std::string_view content) {
  PartFile(target, content).commit();
}

}  // namespace ringwright::postprocess

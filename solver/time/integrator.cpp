#include "solver/time/integrator.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <string>
#include <vector>

#include "solver/failure.hpp"
#include "solver/flow/switched_newton.hpp"
#include "solver/time/step_solver.hpp"
#include "solver/time/sundials_handles.hpp"

namespace ringwright::solver {
namespace {

// Newton's tolerance as a part of the error allowed per step.
constexpr double kStorageShare = 0.002;
constexpr double kUnknownTolerance = 2e-5;  // [m]
constexpr double kNoWeight = 1e-30;         // totals do not take part in the error test
constexpr int kMaxOrder = 3;
constexpr long kMostSteps = 20000;             // per leg; a test takes some hundred
constexpr double kLargestExtrapolation = 0.5;  // of u, per step [m]

}  // namespace

struct Integrator::Impl final : StepSolver {
  FlowSystem& flow;
  SwitchedNewton newton;
  double tolerance;
  std::size_t n, m;  // unknowns, totals

  ContextHandle context = make_context();
  VectorHandle y, yp, work;
  NonlinearSolverHandle nonlinear;
  IdaHandle ida;

  std::vector<double> u, u_before, u_trial;
  double t = 0.0, t_before = 0.0, t_start = 0.0;
  double u_rate_span = 0.0;      // length of the step from u_before to u; 0: none yet
  IntegratorStatistics earlier;  // of legs before the last start
  long newton_failures = 0, steps_in_leg = 0;
  bool initialised = false;

  Impl(FlowSystem& f, double theta_tolerance)
      : flow(f),
        newton(f, {.storage = kStorageShare * theta_tolerance, .unknown = kUnknownTolerance}),
        tolerance(theta_tolerance),
        n(static_cast<std::size_t>(f.unknowns())),
        m(f.totals().size()),
        u(n),
        u_before(n),
        u_trial(n) {
    const auto size = static_cast<sunindextype>(n + m);
    y = make_vector(size, context.get());
    yp = make_vector(size, context.get());
    work = make_vector(size, context.get());
    nonlinear = make_nonlinear_solver(*this, context.get());
  }

  double* data(N_Vector v) const { return N_VGetArrayPointer(v); }

  void make_ida();
  int solve_step(N_Vector correction) override;
  void guess(double t_new, std::span<const double> W);
  void check(int flag, const char* what) const;
  [[noreturn]] void fail(int flag) const;
  [[noreturn]] void fail_because(const std::string& cause) const;
};

void Integrator::Impl::make_ida() {
  ida.reset(IDACreate(context.get()));
  if (!ida) throw std::bad_alloc();
  // The residual function is never called: the step solver forms its own.
  const auto unused = [](realtype, N_Vector, N_Vector, N_Vector, void*) { return -1; };
  const auto weights = [](N_Vector, N_Vector w, void* self) {
    const Impl& impl = *static_cast<Impl*>(self);
    double* v = impl.data(w);
    // IDA's mean runs over all entries; this makes it one over the cells alone, so that the
    // number of patches does not change the steps.
    const double share =
        std::sqrt(static_cast<double>(impl.n + impl.m) / static_cast<double>(impl.n));
    std::fill_n(v, impl.n, share / impl.tolerance);
    std::fill_n(v + impl.n, impl.m, kNoWeight);
    return 0;
  };
  const auto silent = [](int, const char*, const char*, char*, void*) {};
  check(IDASetErrHandlerFn(ida.get(), silent, nullptr), "IDASetErrHandlerFn");
  check(IDAInit(ida.get(), unused, t, y.get(), yp.get()), "IDAInit");
  check(IDASetUserData(ida.get(), this), "IDASetUserData");
  check(IDAWFtolerances(ida.get(), weights), "IDAWFtolerances");
  check(IDASetMaxOrd(ida.get(), kMaxOrder), "IDASetMaxOrd");
  check(IDASetMaxConvFails(ida.get(), 30), "IDASetMaxConvFails");
  check(IDASetMaxErrTestFails(ida.get(), 30), "IDASetMaxErrTestFails");
  check(IDASetNonlinearSolver(ida.get(), nonlinear.get()), "IDASetNonlinearSolver");
  initialised = true;
}

// Dry cells follow IDA's predicted water content (u is affine in it), wet cells go on in a
// straight line.
void Integrator::Impl::guess(double t_new, std::span<const double> W) {
  const double ratio = u_rate_span > 0.0 ? std::min((t_new - t) / u_rate_span, 3.0) : 0.0;
  for (std::size_t i = 0; i < n; ++i) {
    const int cell = static_cast<int>(i);
    const auto [driest, entry, turn] = flow.bounds(cell);
    if (u[i] < turn) {
      const double Se = W[i] / flow.fillable(cell);
      const double next = flow.table(cell).u_of_saturation(Se);
      const double floor = driest + 0.1 * (u[i] - driest);
      u_trial[i] = std::clamp(next, floor, std::max(entry, u[i]));
    } else {
      const double change = (u[i] - u_before[i]) * ratio;
      double next = u[i] + std::clamp(change, -kLargestExtrapolation, kLargestExtrapolation);
      if ((u[i] < entry) != (next < entry)) next = u[i];
      u_trial[i] = next;
    }
  }
}

int Integrator::Impl::solve_step(N_Vector correction) {
  realtype t_new = 0.0, c = 0.0;
  N_Vector W_pred, Wp_pred, unused_y, unused_yp, unused_res;
  void* unused_data;
  IDAGetNonlinearSystemData(ida.get(), &t_new, &W_pred, &Wp_pred, &unused_y, &unused_yp,
                            &unused_res, &c, &unused_data);
  const std::span<const double> W(data(W_pred), n), W_rate(data(Wp_pred), n);
  flow.set_time(t_new);
  guess(t_new, W);
  failures = 0;
  const bool converged = newton.solve(W, W_rate, c, u_trial);
  iterations = newton.last_iterations();
  if (!converged) {
    failures = 1;
    ++newton_failures;
    return SUN_NLS_CONV_RECVR;
  }
  double* out = data(correction);
  for (std::size_t i = 0; i < n; ++i) out[i] = flow.storage(static_cast<int>(i)) - W[i];
  const double* total_rate = data(Wp_pred) + n;
  for (std::size_t k = 0; k < m; ++k) out[n + k] = (flow.totals()[k] - total_rate[k]) / c;
  return SUN_NLS_SUCCESS;
}

void Integrator::Impl::check(int flag, const char* what) const {
  if (flag < 0) throw std::runtime_error(std::string(what) + " failed");
}

void Integrator::Impl::fail(int flag) const {
  if (error) std::rethrow_exception(error);
  char* name = IDAGetReturnFlagName(flag);
  const std::string reason = name ? name : "unknown";
  std::free(name);
  fail_because("the time step became too small or the iteration did not converge (" + reason + ")");
}

void Integrator::Impl::fail_because(const std::string& cause) const {
  realtype step = 0.0;
  IDAGetCurrentStep(ida.get(), &step);
  const auto defects = newton.last_defects();
  std::vector<WorstCell> cells;
  for (std::size_t i = 0; i < n; ++i) {
    const double size = std::abs(defects[i]) / (flow.volume()[i] * tolerance);
    // where the iteration left the numbers, the last head that was one
    const double last = std::isfinite(u_trial[i]) ? u_trial[i] : u[i];
    cells.push_back({static_cast<int>(i),
                     {},
                     flow.head_of_u(static_cast<int>(i), last),
                     std::isnan(size) ? std::numeric_limits<double>::infinity() : size});
  }
  const auto count = static_cast<std::ptrdiff_t>(std::min<std::size_t>(5, n));
  std::partial_sort(cells.begin(), cells.begin() + count, cells.end(),
                    [](const WorstCell& a, const WorstCell& b) { return a.size > b.size; });
  cells.resize(static_cast<std::size_t>(count));
  throw SolverFailure(cause, t, step, std::move(cells));
}

Integrator::Integrator(FlowSystem& flow, double theta_tolerance)
    : impl_(std::make_unique<Impl>(flow, theta_tolerance)) {}
Integrator::~Integrator() = default;

void Integrator::start(double t, std::span<const double> u, double first_step) {
  Impl& s = *impl_;
  s.error = nullptr;
  s.steps_in_leg = 0;
  s.t = s.t_before = s.t_start = t;
  std::copy(u.begin(), u.end(), s.u.begin());
  s.u_before = s.u;
  s.u_rate_span = 0.0;
  s.newton.reset();
  s.flow.set_time(t);
  s.flow.set_state(u);
  double *y = s.data(s.y.get()), *yp = s.data(s.yp.get());
  std::vector<double> out(s.n);
  s.flow.net_outflow(out);
  for (std::size_t i = 0; i < s.n; ++i) {
    y[i] = s.flow.storage(static_cast<int>(i));
    yp[i] = -out[i] / s.flow.volume()[i];
  }
  for (std::size_t k = 0; k < s.m; ++k) y[s.n + k] = 0.0, yp[s.n + k] = s.flow.totals()[k];
  if (s.initialised) {
    s.earlier = statistics();
    s.check(IDAReInit(s.ida.get(), t, s.y.get(), s.yp.get()), "IDAReInit");
  } else {
    s.make_ida();
  }
  s.check(IDASetInitStep(s.ida.get(), first_step), "IDASetInitStep");
}

double Integrator::step(double stop) {
  Impl& s = *impl_;
  s.check(IDASetStopTime(s.ida.get(), stop), "IDASetStopTime");
  if (++s.steps_in_leg > kMostSteps)
    s.fail_because("more than " + std::to_string(kMostSteps) + " time steps");
  realtype reached = s.t;
  const int flag = IDASolve(s.ida.get(), stop, &reached, s.y.get(), s.yp.get(), IDA_ONE_STEP);
  if (flag < 0) s.fail(flag);
  s.u_before.swap(s.u);
  std::copy(s.u_trial.begin(), s.u_trial.end(), s.u.begin());
  s.u_rate_span = reached - s.t;
  s.t_before = s.t;
  s.t = reached;
  return reached;
}

double Integrator::time() const { return impl_->t; }
double Integrator::last_step() const { return impl_->t - impl_->t_before; }
std::span<const double> Integrator::u() const { return impl_->u; }

void Integrator::totals_at(double t, std::span<double> volumes, std::span<double> flows) const {
  Impl& s = *impl_;
  s.check(IDAGetDky(s.ida.get(), t, 0, s.work.get()), "IDAGetDky");
  std::copy_n(s.data(s.work.get()) + s.n, s.m, volumes.begin());
  s.check(IDAGetDky(s.ida.get(), t, 1, s.work.get()), "IDAGetDky");
  std::copy_n(s.data(s.work.get()) + s.n, s.m, flows.begin());
}

double Integrator::stored_at(double t) const {
  Impl& s = *impl_;
  s.check(IDAGetDky(s.ida.get(), t, 0, s.work.get()), "IDAGetDky");
  const double* W = s.data(s.work.get());
  double sum = 0.0;
  for (int i = 0; i < s.flow.cells(); ++i)
    sum += s.flow.volume()[static_cast<std::size_t>(i)] * W[i];
  return sum;
}

void Integrator::storage_at(double t, std::span<double> W) const {
  Impl& s = *impl_;
  s.check(IDAGetDky(s.ida.get(), t, 0, s.work.get()), "IDAGetDky");
  std::copy_n(s.data(s.work.get()), s.n, W.begin());
}

void Integrator::u_at(double t, std::span<double> u) const {
  const Impl& s = *impl_;
  const double w = s.t > s.t_before ? (t - s.t_before) / (s.t - s.t_before) : 1.0;
  for (std::size_t i = 0; i < s.n; ++i) u[i] = s.u_before[i] + w * (s.u[i] - s.u_before[i]);
}

IntegratorStatistics Integrator::statistics() const {
  const Impl& s = *impl_;
  IntegratorStatistics r = s.earlier;
  long steps = 0, failures = 0;
  IDAGetNumSteps(s.ida.get(), &steps);
  IDAGetNumErrTestFails(s.ida.get(), &failures);
  r.steps += steps;
  r.error_test_failures += failures;
  r.newton_iterations = s.newton.iterations();
  r.factorisations = s.newton.factorisations();
  r.convergence_failures = s.newton_failures;
  return r;
}

}  // namespace ringwright::solver

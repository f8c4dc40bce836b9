#include "cases/input/starter_case.hpp"

namespace ringwright::cases {

std::string starter_case() {
  return R"(# A case file: what you know of the ground, and the ring test you think of.
# Values carry their units as you write them: 30 cm, 12 in, 18 mm/h, 0.5 in/h, 2 h, 10 degC.
# Lines that begin with # are not read. All numbers here are invented: put your own.
ringwright: 1                    # version of this grammar; stays on top
job: name of the job
# accuracy: 1 %                  # of every printed figure; 0.1 % to 5 %

ground:
  texture: silt loam, moist      # class and dry, moist or wet; "ringwright soils" lists the classes
  water: 10 degC                 # temperature of the water in the test
  # Kfs: 18 mm/h at 20 degC      # if you know it better than the published averages
  # moisture: suction 300 cm     # instead of the word: suction, content 25 %, or 60 % full
  # published: Carsel & Parrish 1988     # one table of class averages instead of all
  # minimum capillary height: -2 cm      # of the van Genuchten curve
  # test level: 60 cm below ground       # layers and water table count from the ground
  # layers: clay loam, wet from 5 ft down
  # wall gap: 0.05 mm             # what driving the ring may do; or
  # disturbed: { width: 1 cm, Ks x: 0.3 }
  #
  # Instead of the texture you may give the soil
  # by what a crew knows of it
  #   capillary length: 8 cm     # or  alpha star: 0.12 1/cm
  #   fillable porosity: 25 %
  #   Kfs: 18 mm/h at 20 degC
  # or by its parameters
  #   parameters: { theta_r: 0.078, theta_s: 0.43, alpha: 3.6 1/m, n: 1.56, Ks: 1.04 cm/h }

tests:
  one head:                      # any name; several tests may follow each other
    ring: 30 cm                  # inner diameter
    insert: 10 cm                # how deep the wall stands in the ground
    head: 5 cm                   # depth of water held in the ring
    # wall: 3 mm                 # counts for a ring set on the surface (insert: 0 cm)
    # height: 40 cm              # of the ring, to check that it holds all this
    # outer ring: 60 cm          # of a double ring; outer insert, outer head: as inside
    # soak: 5 cm for 30 min      # first, and not read
    #
    # Instead of the head
    #   heads: 5 cm then 15 cm, each for 1 h
    #   fall: from 20 cm to 5 cm
  stop: 3 readings within 5 %, or 8 h    # or: after 6 h
  read: every 10 min             # may go on: ruler to 1 mm, head kept to 5 mm
  # also judge: after 6 h        # what another stop rule would have said
  # gauge: 1 mm in a 10 cm tube  # one division of what the water is read on
  # supply: 6 L/min              # the largest flow
  # reservoir: 200 L
  # evaporation: 5 mm/d
  # assumed alpha star: 0.12 1/cm        # what the crew puts into its formula
)";
}

}  // namespace ringwright::cases

#pragma once
/// The mesh as the discretisation sees it: cells and faces, no coordinates.
///
/// A cell has a volume, the elevation of its centre and a soil index. An inner face
/// joins two cells through a transmissibility (area over distance of the centres, with
/// any correction for a singularity already in it); where the two cells are of different
/// soils the flow equation needs to know how much of the resistance lies on either side.
/// A face without rise carries horizontal flow. A boundary face belongs to one cell
/// and to a named patch. A ring wall is the absence of faces: cells on its two sides
/// simply are not joined. The same arrays describe a column, an axisymmetric section
/// (true volumes and areas of the full circle) and a 3-D body, and the flow code cannot
/// tell them apart.
///
/// `drawing` holds what only pictures and export need.

#include <array>
#include <string>
#include <vector>

namespace ringwright::solver {

struct Face {
  int a = 0, b = 0;             ///< the two cells; flow is counted positive from a to b
  double transmissibility = 0;  ///< [m]: area [m2] over distance [m]
  double rise = 0;              ///< elevation of a minus elevation of b [m]
  double part_a = 0.5;          ///< part of the resistance, and of the rise, on the side of a [-]
  bool horizontal = false;      ///< the flow through it is horizontal: the soil's anisotropy acts
};

struct BoundaryFace {
  int cell = 0;
  int patch = 0;                ///< index into CellsAndFaces::patches
  double transmissibility = 0;  ///< [m], from the cell centre to the face
  double rise = 0;              ///< elevation of the cell minus elevation of the face [m]
  double area = 0;              ///< [m2]
  double normal_down = 0;       ///< downward component of the outward unit normal [-]
  double elevation = 0;         ///< of the face centre [m]
  double position = 0;          ///< coordinate along the patch, for a head that varies there [m]
  bool horizontal = false;      ///< as of an inner face
};

/// Cell polygons in the plane of the section, for drawing and export only.
struct Drawing {
  std::vector<std::array<double, 2>> points;   ///< (r or x, z) [m]
  std::vector<std::array<int, 4>> cells;       ///< corner points of each cell, counter-clockwise
  std::vector<std::array<double, 2>> centres;  ///< (r or x, z) of each cell [m]
};

struct CellsAndFaces {
  std::vector<double> volume;     ///< [m3], one per cell
  std::vector<double> elevation;  ///< of the cell centre [m], 0 at the soil surface, up
  std::vector<int> soil;          ///< soil index, one per cell
  std::vector<Face> faces;
  std::vector<BoundaryFace> boundary;
  std::vector<std::string> patches;  ///< names of the boundary patches
  Drawing drawing;

  int cells() const { return static_cast<int>(volume.size()); }
};

/// The same body with gravity off.
CellsAndFaces without_gravity(CellsAndFaces mesh);

}  // namespace ringwright::solver

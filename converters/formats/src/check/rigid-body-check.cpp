// Compares URDF files with the numbers our own composite-rigid-body computation wrote beside them, by an independent
// rigid-body library (DART). Usage: rigid-body-check FOLDER; each NAME.urdf has a NAME.expected of lines
//   mass M | pose q... | com x y z | matrix n*n values, row by row
// with com and matrix of the pose before. The first link is free in the library: its six coordinates come first, are
// held at 0, and their rows and columns of the matrix are left out.
#include <cmath>
#include <dart/dynamics/BodyNode.hpp>
#include <dart/dynamics/Skeleton.hpp>
#include <dart/utils/urdf/urdf.hpp>
#include <filesystem>
#include <fstream>
#include <iostream>
#include <sstream>

static int compared = 0;
static int failed = 0;

static void compare(const std::string& what, double found, double expected, double scale) {
  ++compared;
  if (!(std::abs(found - expected) <= 1e-6 * scale)) {
    ++failed;
    std::cout << what << ": " << found << ", expected " << expected << "\n";
  }
}

int main(int count, char** arguments) {
  if (count != 2) return 2;
  int files = 0;
  for (const auto& entry : std::filesystem::directory_iterator(std::filesystem::absolute(arguments[1]))) {
    if (entry.path().extension() != ".urdf") continue;
    ++files;
    dart::utils::DartLoader loader;
    auto robot = loader.parseSkeleton(dart::common::Uri::createFromPath(entry.path().string()));
    if (!robot) {
      std::cout << entry.path() << ": not loaded\n";
      return 1;
    }
    const long free = 6;
    auto expectedPath = entry.path();
    std::ifstream in(expectedPath.replace_extension(".expected"));
    std::string line;
    while (std::getline(in, line)) {
      std::istringstream words(line);
      std::string kind;
      words >> kind;
      std::vector<double> values;
      for (double v; words >> v;) values.push_back(v);
      const std::string what = entry.path().filename().string() + " " + kind;
      if (kind == "mass") {
        compare(what, robot->getMass(), values.at(0), values.at(0));
      } else if (kind == "pose") {
        values.insert(values.begin(), free, 0.0);
        robot->setPositions(Eigen::Map<Eigen::VectorXd>(values.data(), values.size()));
      } else if (kind == "com") {
        const Eigen::Vector3d com = robot->getCOM();
        for (int i = 0; i < 3; ++i) compare(what, com[i], values.at(i), 1);
      } else if (kind == "matrix") {
        const Eigen::MatrixXd whole = robot->getMassMatrix();
        const long joints = whole.rows() - free;
        const Eigen::MatrixXd m = whole.bottomRightCorner(joints, joints);
        if (m.size() != static_cast<long>(values.size())) { std::cout << what << ": wrong size\n"; return 1; }
        // Of the largest element, which is what a simulation feels.
        const double scale = m.cwiseAbs().maxCoeff();
        for (long i = 0; i < m.rows(); ++i)
          for (long j = 0; j < m.cols(); ++j) compare(what, m(i, j), values.at(i * m.cols() + j), scale);
      }
    }
  }
  std::cout << "independent rigid-body check: " << files << " models, " << compared - failed << " passed, " << failed << " failed\n";
  return files == 0 || failed > 0 ? 1 : 0;
}

"""Invented pilot seasons: counts and distances drawn from stated parameters, never from a real survey."""

import csv
import math
import random


class Pilot:
    """Draws counts and detections. Uses only random() of Python's generator, which is promised to stay the same."""

    def __init__(self, seed):
        self._random = random.Random(seed).random
        self.transects, self.detections = [], []

    def transect(self, stratum, name, effort, mean, dispersion, distance, mean_size):
        """One transect: a negative-binomial count with variance about dispersion x mean, each detection with its
        distance (a function that draws one) and its cluster size (1 + geometric; None where animals are alone)."""
        count = self._poisson(self._gamma(mean, dispersion - 1))
        self.transects.append((stratum, name, effort, count))
        for _ in range(count):
            size = 1 if mean_size is None else 1 + self._geometric(mean_size - 1)
            self.detections.append((name, distance(), size))

    def line_distance(self, sigma, half_width):
        """Perpendicular distance under a half-normal detection function, truncated at the half-width, whole metres."""
        while True:
            x = self._random() * half_width
            if self._random() < math.exp(-x * x / (2 * sigma * sigma)):
                return round(x)

    def point_distance(self, sigma, radius):
        """Radial distance: as many animals as area, seen with a half-normal detection function, whole metres."""
        while True:
            r = math.sqrt(self._random()) * radius
            if self._random() < math.exp(-r * r / (2 * sigma * sigma)):
                return round(r)

    def between(self, low, high):
        return low + (high - low) * self._random()

    def _gamma(self, mean, scale):
        """Gamma with the shape rounded to a whole number of exponentials, the mean kept."""
        shape = max(1, round(mean / scale))
        return -mean / shape * sum(math.log(1 - self._random()) for _ in range(shape))

    def _poisson(self, mean):
        limit, product, count = math.exp(-mean), self._random(), 0
        while product > limit:
            product *= self._random()
            count += 1
        return count

    def _geometric(self, mean):
        return int(math.log(1 - self._random()) / math.log(mean / (1 + mean)))

    def write(self, folder, effort_column, with_strata):
        transects = [row if with_strata else row[1:] for row in self.transects]
        head = ["stratum"] * with_strata + ["transect", effort_column, "count"]
        _write(folder / "pilot-transects.csv", head, transects)
        _write(folder / "pilot-detections.csv", ["transect", "distance_m", "size"], self.detections)


def _write(path, head, rows):
    with open(path, "w", newline="", encoding="utf-8") as file:
        csv.writer(file, lineterminator="\n").writerows([head, *rows])

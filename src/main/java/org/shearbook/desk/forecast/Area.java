package org.shearbook.desk.forecast;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;

/** The area a forecast is for. Positions are in degrees, north and east positive, in whole minutes. */
public sealed interface Area {

    /** Whether a position lies inside or on the edge. */
    boolean contains(double latitude, double longitude);

    /** Everything within a distance of a place. */
    record Radius(String centre, double latitude, double longitude, int nauticalMiles) implements Area {

        @Override
        public boolean contains(double otherLatitude, double otherLongitude) {
            return distance(latitude, longitude, otherLatitude, otherLongitude) <= nauticalMiles + 1e-6;
        }
    }

    /** A corner point. */
    record Corner(double latitude, double longitude) {
    }

    /** What lies between corner points, joined in their order by the short way. */
    record Corners(List<Corner> corners) implements Area {

        public Corners {
            corners = List.copyOf(corners);
        }

        /**
         * {@inheritDoc}
         *
         * <p>Counts how often a line to the east crosses the edge, on the plane of latitude and longitude, where a
         * limit along a parallel stays one. Longitudes are taken relative to the position asked for, so the date line
         * needs no case of its own.
         */
        @Override
        public boolean contains(double latitude, double longitude) {
            boolean inside = false;
            double x1 = shortWay(corners.get(0).longitude() - longitude);
            for (int i = 0; i < corners.size(); i++) {
                Corner from = corners.get(i);
                Corner to = corners.get((i + 1) % corners.size());
                double x2 = x1 + shortWay(to.longitude() - from.longitude());
                double y1 = from.latitude() - latitude;
                double y2 = to.latitude() - latitude;
                if (isOnEdge(x1, y1, x2, y2)) {
                    return true;
                }
                if (y1 > 0 != y2 > 0 && x1 + (x2 - x1) * y1 / (y1 - y2) > 0) {
                    inside = !inside;
                }
                x1 = x2;
            }
            return inside;
        }

        private static boolean isOnEdge(double x1, double y1, double x2, double y2) {
            double tolerance = 1e-7;
            double cross = x1 * y2 - x2 * y1;
            return Math.abs(cross) < tolerance
                    && Math.min(x1, x2) <= tolerance && Math.max(x1, x2) >= -tolerance
                    && Math.min(y1, y2) <= tolerance && Math.max(y1, y2) >= -tolerance;
        }

        /** Whether the corners are the four of a box between two parallels and two meridians. */
        public boolean isBox() {
            if (corners.size() != 4) {
                return false;
            }
            TreeSet<Double> latitudes = new TreeSet<>();
            TreeSet<Double> longitudes = new TreeSet<>();
            corners.forEach(corner -> {
                latitudes.add(corner.latitude());
                longitudes.add(corner.longitude());
            });
            return latitudes.size() == 2 && longitudes.size() == 2 && List.copyOf(new TreeSet<>(corners.stream()
                    .map(corner -> corner.latitude() + "/" + corner.longitude()).toList())).size() == 4;
        }

        /** How many degrees of longitude the edge goes round in all: 0, or 360 where it encloses a pole. */
        double longitudesGoneRound() {
            double sum = 0;
            for (int i = 0; i < corners.size(); i++) {
                sum += shortWay(corners.get((i + 1) % corners.size()).longitude() - corners.get(i).longitude());
            }
            return sum;
        }

        /** Area on the plane of latitude and longitude [deg²]; 0 where all corners lie on one line. */
        double squareDegrees() {
            double twice = 0;
            double x = 0;
            for (int i = 0; i < corners.size(); i++) {
                Corner from = corners.get(i);
                Corner to = corners.get((i + 1) % corners.size());
                double next = x + shortWay(to.longitude() - from.longitude());
                twice += x * to.latitude() - next * from.latitude();
                x = next;
            }
            return Math.abs(twice) / 2;
        }

        /** Whether two edges that are not neighbours cross. */
        boolean crossesItself() {
            List<double[]> points = new ArrayList<>();
            double x = 0;
            for (int i = 0; i < corners.size(); i++) {
                points.add(new double[] {x, corners.get(i).latitude()});
                x += shortWay(corners.get((i + 1) % corners.size()).longitude() - corners.get(i).longitude());
            }
            int n = points.size();
            for (int i = 0; i < n; i++) {
                for (int j = i + 2; j < n; j++) {
                    if ((j + 1) % n != i && cross(points.get(i), points.get((i + 1) % n), points.get(j), points.get((j + 1) % n))) {
                        return true;
                    }
                }
            }
            return false;
        }

        private static boolean cross(double[] a, double[] b, double[] c, double[] d) {
            return side(a, b, c) * side(a, b, d) < 0 && side(c, d, a) * side(c, d, b) < 0;
        }

        private static double side(double[] a, double[] b, double[] p) {
            return Math.signum((b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0]));
        }
    }

    /** A box between two parallels and two meridians, from its south-west corner clockwise. */
    static Corners box(double south, double north, double west, double east) {
        return new Corners(List.of(new Corner(south, west), new Corner(north, west), new Corner(north, east), new Corner(south, east)));
    }

    /** Great-circle distance [NM], one minute of arc to the mile. */
    static double distance(double latitude1, double longitude1, double latitude2, double longitude2) {
        double f1 = Math.toRadians(latitude1);
        double f2 = Math.toRadians(latitude2);
        double s = Math.pow(Math.sin((f2 - f1) / 2), 2)
                + Math.cos(f1) * Math.cos(f2) * Math.pow(Math.sin(Math.toRadians(longitude2 - longitude1) / 2), 2);
        return Math.toDegrees(2 * Math.asin(Math.min(1, Math.sqrt(s)))) * 60;
    }

    private static double shortWay(double degrees) {
        double turned = degrees % 360;
        return turned > 180 ? turned - 360 : turned < -180 ? turned + 360 : turned;
    }

    /** Whether two areas can have a position in common; may say yes where the shapes only come close. */
    static boolean mayOverlap(Area one, Area other) {
        return touches(one, other) || touches(other, one);
    }

    private static boolean touches(Area one, Area other) {
        if (one instanceof Radius a && other instanceof Radius b) {
            return distance(a.latitude(), a.longitude(), b.latitude(), b.longitude()) <= a.nauticalMiles() + b.nauticalMiles();
        }
        return edge(other).stream().anyMatch(point -> one.contains(point.latitude(), point.longitude()));
    }

    /** Points along the edge, close enough together that no area of a forecast slips between them, and the middle of a radius. */
    private static List<Corner> edge(Area area) {
        List<Corner> points = new ArrayList<>();
        if (area instanceof Radius round) {
            points.add(new Corner(round.latitude(), round.longitude()));
            double reach = round.nauticalMiles() / 60.0;
            double widening = Math.max(0.05, Math.cos(Math.toRadians(round.latitude())));
            for (int i = 0; i < 72; i++) {
                double angle = Math.PI * i / 36;
                double latitude = round.latitude() + reach * Math.cos(angle);
                if (Math.abs(latitude) <= 90) {
                    points.add(new Corner(latitude, round.longitude() + reach * Math.sin(angle) / widening));
                }
            }
        } else if (area instanceof Corners many) {
            for (int i = 0; i < many.corners().size(); i++) {
                Corner from = many.corners().get(i);
                Corner to = many.corners().get((i + 1) % many.corners().size());
                for (int step = 0; step < 40; step++) {
                    points.add(new Corner(from.latitude() + (to.latitude() - from.latitude()) * step / 40,
                            from.longitude() + shortWay(to.longitude() - from.longitude()) * step / 40));
                }
            }
        }
        return points;
    }
}

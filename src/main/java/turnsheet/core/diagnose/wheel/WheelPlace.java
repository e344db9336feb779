package turnsheet.core.diagnose.wheel;

/**
 * One tooth of the wheel.
 *
 * @param tooth its number, from 1
 * @param percentOfPeriod how far its edge lies from its even place, positive where it is late
 * @param arcSeconds the same in arc seconds of the turn
 */
public record WheelPlace(int tooth, double percentOfPeriod, double arcSeconds) {}

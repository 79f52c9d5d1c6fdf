import { ComputeError } from '@/shared/compute/errors'

/**
 * Storey height from brick courses counted between two sills one above the other,
 *
 *     h = n · c
 *
 * @param courses courses counted from sill to sill [–], > 0
 * @param courseMm height of a course with its joint [mm], > 0
 * @returns floor level to floor level [m]: sills repeat from storey to storey
 * @throws {ComputeError} `parameter-not-positive`
 * @see common practice of surveyors.
 * @example
 * storeyHeightFromCourses(40, 75) // => 3
 */
export function storeyHeightFromCourses(courses: number, courseMm: number): number {
  if (!(courses > 0 && courseMm > 0 && courses * courseMm < Infinity)) {
    throw new ComputeError('parameter-not-positive', { courses, courseMm })
  }
  return (courses * courseMm) / 1000
}

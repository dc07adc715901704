export { API_GROUP_LIMITS, type ApiGroup, type ApiGroupOfStock, apiGroupOf } from './apiGroup';
export type { Grade, GradeLimit, GradeSystem } from './grade';
export { GRADE_WINDOWS, GRADES, type GradeWindow, gradesOfViscosity } from './gradesOfViscosity';

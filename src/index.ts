/**
 * The public face of the engine. Everything else in src/ is private. Inputs and outputs are plain JSON data;
 * quantities are in the units of the property table, shares are mass fractions 0..1, prices per tonne.
 */

export { type PredictOptions, predictBlend } from './blend/predictBlend';
export type { PredictedProperties, PredictedProperty, RuleSpread } from './blend/predictedProperties';
export type { PredictionOptions, PropertyAt } from './blend/predictionOptions';
export type { AimedRecipe } from './explain/choices/aimedRecipe';
export { type Alternatives, type AlternativesOptions, alternatives } from './explain/choices/alternatives';
export { type BestOfProperty, bestOfProperty, type PropertyAim } from './explain/choices/bestOfProperty';
export { fewestStocks } from './explain/choices/fewestStocks';
export { type NearestRecipe, nearestRecipe } from './explain/choices/nearestRecipe';
export { type RecipeInSteps, roundRecipe } from './explain/choices/roundRecipe';
export type {
  Alternative,
  Demand,
  EntryPrice,
  Explanation,
  Ladder,
  LimitPrice,
  Relaxation,
  RoundedRecipe,
  UsedStock,
  WithinReach,
} from './explain/explanation';
export { applyRelaxation } from './explain/ladder/applyRelaxation';
export { demandInWords } from './explain/ladder/demandInWords';
export { demandsOf, onlyDemands, withoutDemand } from './explain/ladder/demands';
export { explainImpossible, type LadderOptions } from './explain/ladder/explainImpossible';
export { chanceOfPassing } from './explain/precision/chanceOfPassing';
export type { Precisions } from './explain/precision/methodPrecision';
export { type MarginOptions, marginFor } from './explain/precision/precisionMargin';
export { type ExplainOptions, explainRecipe } from './explain/prices/explainRecipe';
export { createEngine } from './optimise/defaultEngine';
export { createCompactEngine } from './optimise/linear/compact/compactEngine';
export { createHighsEngine, type HighsLoading } from './optimise/linear/highsEngine';
export { createJavascriptEngine } from './optimise/linear/javascriptEngine';
export type { LinearEngine } from './optimise/linear/linearEngine';
export type { Dose, Limit, Order, ShareBasis, ShareRule, StockSet } from './optimise/order';
export type {
  BlendOutcome,
  Caution,
  LeftOut,
  LimitCheck,
  OrderProblem,
  Proof,
  SolveProgress,
  Stopped,
} from './optimise/outcome';
export { costOfShare } from './optimise/outcomeOf';
export { pricesRise } from './optimise/rows/priceSegments';
export { solveBlend } from './optimise/solveBlend';
export type { SolveOptions } from './optimise/solveOptions';
export {
  apiGroupOf,
  GRADES,
  type Grade,
  gradesOfViscosity,
} from './property/grades';
export {
  kinematicViscosityAt,
  kvFromWalther,
  logTemperature,
  type ViscosityPoint,
  waltherIndex,
} from './property/kinematicViscosity';
export { OWN_RULES, type OwnProperty, type OwnRule } from './property/ownProperty';
export type { PropertyDefinition, Reproducibility } from './property/propertyDefinition';
export { PROPERTY_TABLE, propertyDefinition, VI_DEFINITION } from './property/propertyTable';
export { kv40ForViscosityIndex, reportedViscosityIndex, viscosityIndex } from './property/viscosityIndex';
export { VISCOSITY_RULE_TABLE, VISCOSITY_RULES, type ViscosityRule } from './property/viscosityRule';
export { FAMILIES, type Family, isBaseOil } from './stock/family';
export { FIGURE_ORIGINS, type Figure, type FigureOrigin } from './stock/figure';
export { findFigure } from './stock/findFigure';
export type { Recipe, RecipeLine, Stock } from './stock/stock';
export { emptyOrder } from './workbook/emptyOrder';
export { emptyWorkbook } from './workbook/emptyWorkbook';
export type { OmittedProduct, UnreadCell } from './workbook/engineStocks';
export { type Restored, restoreWorkbook } from './workbook/restoreWorkbook';
export { serialiseWorkbook } from './workbook/serialiseWorkbook';
export { type EngineOrder, toOrder } from './workbook/toOrder';
export { missingInRule } from './workbook/unfinishedRule';
export {
  type Lot,
  type Product,
  WORKBOOK_FORMAT,
  WORKBOOK_VERSION,
  type Workbook,
  type WorkbookOrder,
  type WorkbookSettings,
} from './workbook/workbook';

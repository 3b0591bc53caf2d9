export { getMonth } from "./get-month";
export { listFigureRows } from "./list-figure-rows";

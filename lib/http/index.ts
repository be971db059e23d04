export { fileResponse } from "./file-response";
export { problemResponse, toProblem, type Problem } from "./problem";
export { readBytes } from "./read-body";
export { route, type RouteHandler, type RouteMeta } from "./route";

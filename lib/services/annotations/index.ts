export { createAnnotation } from "./create-annotation";
export { listAnnotations, type Annotation } from "./queries";

export { checksumOf, getFile, putFile } from "./content-store";

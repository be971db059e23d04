export { findHospitalRow, getHospital, getHospitalName } from "./queries";
export { setUpHospital } from "./set-up-hospital";
export { updateHospital } from "./update-hospital";

export {
  assignedIndicators,
  findAssignment,
  listAssignments,
  type AssignedIndicator,
  type Assignment,
  type ListedAssignment,
} from "./queries";
export { assignmentReply, setAssignment } from "./set-assignment";

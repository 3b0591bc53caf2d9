import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { ChangeRolesInput, InviteStaffMemberInput, StaffRow } from "@withy/contracts/practices";
import { newId } from "@withy/core/ids";
import { useState } from "react";
import {
  changeRoles,
  deactivateStaff,
  inviteStaffMember,
  listStaff,
  reactivateStaff,
  sendInvitationAgain,
} from "../api-client";
import { practiceKeys } from "../query-keys";

/** @param first the list as the server painted it */
export function useStaff(first: StaffRow[]) {
  return useQuery({
    queryKey: practiceKeys.staff,
    queryFn: ({ signal }) => listStaff(signal),
    initialData: first,
  });
}

function useStaffMutation<I, O>(mutationFn: (input: I) => Promise<O>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSettled: () => client.invalidateQueries({ queryKey: practiceKeys.staff }),
  });
}

/** The same form sent twice invites once. */
export function useInvite() {
  const [key] = useState(newId);
  return useStaffMutation((input: InviteStaffMemberInput) => inviteStaffMember(input, key));
}

export const useChangeRoles = () => useStaffMutation((input: ChangeRolesInput) => changeRoles(input));
export const useDeactivate = () => useStaffMutation(deactivateStaff);
export const useReactivate = () => useStaffMutation(reactivateStaff);
export const useInviteAgain = () => useStaffMutation(sendInvitationAgain);

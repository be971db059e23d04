"use client";

import type { UseFormRegister } from "react-hook-form";
import { Checkbox, ChoiceGroup, RadioGroup } from "@/app/_components/ui";
import { grants, hasNamedWards, mayHoldGrants, roles, type Role } from "@/lib/policy";
import { grantWords, peopleWords, roleWords } from "@/lib/strings/people";
import type { WardChoice } from "./people-desk";
import type { PersonForm } from "./person-form";

interface RoleFieldsProps {
  register: UseFormRegister<PersonForm>;
  role: Role;
  wards: WardChoice[];
  errors: Partial<Record<"role" | "wards" | "grants", { message?: string }>>;
}

/** Role, and what goes with it: wards where the role works on named wards, extra powers where it may have them. */
export function RoleFields({ register, role, wards, errors }: RoleFieldsProps) {
  return (
    <>
      <RadioGroup
        id="role"
        label={
          <>
            {peopleWords.role} <small>{peopleWords.roleNote}</small>
          </>
        }
        error={errors.role?.message}
        options={roles.map((each) => ({
          value: each,
          label: <b>{roleWords[each].name}</b>,
          detail: roleWords[each].may,
        }))}
        {...radioProps(register)}
      />
      {hasNamedWards(role) ? (
        <div className="ward-choices">
          <ChoiceGroup
            id="wards"
            label={peopleWords.wards}
            hint={wards.length === 0 ? peopleWords.noWardsMade : undefined}
            error={errors.wards?.message}
          >
            {wards.map((ward) => (
              <Checkbox key={ward.code} label={ward.name} value={ward.code} {...register("wards")} />
            ))}
          </ChoiceGroup>
        </div>
      ) : null}
      {mayHoldGrants(role) ? (
        <ChoiceGroup id="grants" label={peopleWords.extra} error={errors.grants?.message}>
          {grants.map((grant) => (
            <Checkbox
              key={grant}
              label={grantWords[grant].name}
              detail={grantWords[grant].may}
              value={grant}
              {...register("grants")}
            />
          ))}
        </ChoiceGroup>
      ) : null}
    </>
  );
}

/** The group names its radios itself. */
function radioProps(register: UseFormRegister<PersonForm>) {
  const { name, ...input } = register("role");
  return { name, input };
}

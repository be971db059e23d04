"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm, useWatch, type Resolver } from "react-hook-form";
import { problemForForm, sendJson } from "@/app/_hooks/use-api";
import { Button, Notice, TextInput } from "@/app/_components/ui";
import { roles } from "@/lib/policy";
import { peopleWords } from "@/lib/strings/people";
import type { MadeLink, WardChoice } from "./people-desk";
import { inviteForm, personFields, type PersonForm } from "./person-form";
import { RoleFields } from "./role-fields";

interface InvitePersonProps {
  wards: WardChoice[];
  onDone: (link: MadeLink | null) => void;
  onCancel: () => void;
}

export function InvitePerson({ wards, onDone, onCancel }: InvitePersonProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm<PersonForm>({
    resolver: zodResolver(inviteForm) as Resolver<PersonForm>,
    defaultValues: { name: "", email: "", role: roles[0], wards: [], grants: [] },
  });
  const { errors, isSubmitting } = form.formState;
  const role = useWatch({ control: form.control, name: "role" });

  async function send(values: PersonForm) {
    setFailure(null);
    const sent = await sendJson<{ invitation: { link: string } }>("POST", "/api/people", values);
    if (sent.ok) return onDone({ name: values.name, link: sent.data.invitation.link });
    const { fieldErrors, rest } = problemForForm(sent.problem, personFields);
    for (const { name, message } of fieldErrors) form.setError(name, { message });
    setFailure(rest);
  }

  return (
    <form
      className="panel"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <h2 className="section-head">{peopleWords.inviteTitle}</h2>
      <p className="hint mb-3">{peopleWords.inviteNote}</p>
      <TextInput id="name" label={peopleWords.name} error={errors.name?.message} {...form.register("name")} />
      <TextInput
        id="email"
        type="email"
        label={peopleWords.email}
        error={errors.email?.message}
        {...form.register("email")}
      />
      <RoleFields register={form.register} role={role} wards={wards} errors={errors} />
      {failure ? (
        <Notice mark="fix" live="alert" className="mb-3">
          {failure}
        </Notice>
      ) : null}
      <div className="actions">
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {isSubmitting ? peopleWords.saving : peopleWords.sendInvitation}
        </Button>
        <Button onClick={onCancel}>{peopleWords.cancel}</Button>
      </div>
    </form>
  );
}

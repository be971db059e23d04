"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm, useWatch, type Resolver } from "react-hook-form";
import { problemForForm, sendJson, type ApiProblem } from "@/app/_hooks/use-api";
import { Button, Notice, TextInput } from "@/app/_components/ui";
import type { PersonRecord } from "@/lib/schemas/person";
import { peopleWords } from "@/lib/strings/people";
import type { MadeLink, WardChoice } from "./people-desk";
import { editForm, personFields, type PersonForm } from "./person-form";
import { RoleFields } from "./role-fields";

interface EditPersonProps {
  person: PersonRecord;
  wards: WardChoice[];
  onDone: (link: MadeLink | null) => void;
  /** Somebody else saved meanwhile: their version is fetched, and this form gives way to it. */
  onStale: (name: string) => void;
  onCancel: () => void;
}

export function EditPerson({ person, wards, onDone, onStale, onCancel }: EditPersonProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const { name, role: ownRole, wards: ownWards, grants } = person;
  const form = useForm<PersonForm>({
    resolver: zodResolver(editForm) as Resolver<PersonForm>,
    defaultValues: { name, role: ownRole, wards: ownWards, grants },
  });
  const { errors, isSubmitting } = form.formState;
  const role = useWatch({ control: form.control, name: "role" });

  function show(problem: ApiProblem) {
    if (problem.current) return onStale(name);
    const { fieldErrors, rest } = problemForForm(problem, personFields);
    for (const { name: field, message } of fieldErrors) form.setError(field, { message });
    setFailure(rest);
  }

  async function patch(change: object) {
    setFailure(null);
    const sent = await sendJson("PATCH", `/api/people/${person.id}`, { ...change, version: person.version });
    if (sent.ok) onDone(null);
    else show(sent.problem);
  }

  async function makeLink() {
    setFailure(null);
    const sent = await sendJson<{ invitation: { link: string } }>(
      "POST",
      `/api/people/${person.id}/invitation`,
    );
    if (sent.ok) onDone({ name, link: sent.data.invitation.link });
    else show(sent.problem);
  }

  return (
    <form
      className="panel"
      noValidate
      method="post"
      onSubmit={(event) => void form.handleSubmit((values) => patch(values))(event)}
    >
      <h2 className="section-head">{name}</h2>
      <p className="hint mb-3">{person.email}</p>
      <TextInput id="name" label={peopleWords.name} error={errors.name?.message} {...form.register("name")} />
      <RoleFields register={form.register} role={role} wards={wards} errors={errors} />
      <p className="notice mb-3">{peopleWords.takesEffect}</p>
      {failure ? (
        <Notice mark="fix" live="alert" className="mb-3">
          {failure}
        </Notice>
      ) : null}
      <div className="actions">
        <Button look="primary" type="submit" disabled={isSubmitting}>
          {isSubmitting ? peopleWords.saving : peopleWords.save}
        </Button>
        <Button onClick={onCancel}>{peopleWords.cancel}</Button>
        <Button look="text" onClick={() => void patch({ state: person.state === "off" ? "active" : "off" })}>
          {person.state === "off" ? peopleWords.switchOn : peopleWords.switchOff}
        </Button>
      </div>
      {person.state === "off" ? null : (
        <div className="mt-3">
          <Button look="text" onClick={() => void makeLink()}>
            {peopleWords.newLink}
          </Button>
          <span className="hint">{peopleWords.newLinkNote}</span>
        </div>
      )}
    </form>
  );
}

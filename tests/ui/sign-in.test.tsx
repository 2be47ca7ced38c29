import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, test, vi } from "vitest";
import { SignIn } from "@/app/sign-in/sign-in";

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const people = [
  { name: "Ines Hartwell", email: "ines.hartwell@quillhaven.example", role: "designer" },
  { name: "Ada Winslade", email: "ada.winslade@quillhaven.example", role: "admin" },
];

const email = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Work email" });
const password = () => screen.getByLabelText<HTMLInputElement>("Password");
const send = () => fireEvent.click(screen.getByRole("button", { name: "Sign in" }));

/** The network answers with a refusal. */
function refuse(detail: string, status = 401) {
  const problem = { type: "about:blank", title: "Unauthorized", status, detail };
  const answer = () =>
    Promise.resolve(Response.json(problem, { status, headers: { "Content-Type": "application/problem+json" } }));
  const network = vi.fn<typeof fetch>(answer);
  vi.stubGlobal("fetch", network);
  return network;
}

test("choosing a person of the demo fills the form", () => {
  render(<SignIn next="/runs" people={people} password="spring-tide-demo" />);
  fireEvent.click(screen.getByRole("button", { name: "Ada Winslade" }));
  expect([email().value, password().value]).toEqual(["ada.winslade@quillhaven.example", "spring-tide-demo"]);
});

test("outside the demo nobody is named", () => {
  render(<SignIn next="/runs" people={null} password={null} />);
  expect(screen.queryByText("This is the demo")).toBeNull();
});

test("a refusal of the server is shown in its own words", async () => {
  const network = refuse("The address and the password do not belong together.");
  render(<SignIn next="/runs" people={people} password="spring-tide-demo" />);
  fireEvent.input(email(), { target: { value: "ines.hartwell@quillhaven.example" } });
  fireEvent.input(password(), { target: { value: "wrong" } });
  send();
  expect(await screen.findByText("The address and the password do not belong together.")).toBeTruthy();
  const [path, request] = network.mock.calls[0] ?? [];
  expect(path).toBe("/api/v1/session");
  expect(JSON.parse(String(request?.body))).toEqual({ email: "ines.hartwell@quillhaven.example", password: "wrong" });
});

test("an empty form is not sent; each field says what it needs", async () => {
  const network = refuse("unused");
  render(<SignIn next="/runs" people={null} password={null} />);
  send();
  expect(await screen.findByText("The password is needed.")).toBeTruthy();
  expect(screen.getByText("The mail address is needed.")).toBeTruthy();
  expect(network).not.toHaveBeenCalled();
});

test("the password is hidden until asked for", () => {
  render(<SignIn next="/runs" people={null} password={null} />);
  expect(password().type).toBe("password");
  fireEvent.click(screen.getByRole("button", { name: "Show" }));
  expect(password().type).toBe("text");
});

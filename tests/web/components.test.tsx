import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState, type FormEvent } from "react";
import { useForm } from "react-hook-form";
import { MemoryRouter, Route, Routes, useLocation } from "react-router-dom";
import { afterEach, describe, expect, it, vi } from "vitest";
import { Announcer, useAnnounce } from "#web/components/announcer.tsx";
import { Button } from "#web/components/button.tsx";
import { DataTable, type Column } from "#web/components/data-table.tsx";
import { ErrorSummary } from "#web/components/error-summary.tsx";
import { Menu, MenuEntry } from "#web/components/menu.tsx";
import { OptionList, type OptionRow } from "#web/components/option-list.tsx";
import { TextArea } from "#web/components/text-area.tsx";
import { NumberField, TextField } from "#web/components/text-field.tsx";
import { formErrors, showRefusal } from "#web/lib/form-errors.ts";
import { ApiProblem } from "#web/lib/problems.ts";

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function described(element: HTMLElement): string {
  const ids = element.getAttribute("aria-describedby")?.split(" ") ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? "?").join(" | ");
}

describe("Button", () => {
  it("cannot be hit twice while busy, keeps focus and says what runs", async () => {
    const user = userEvent.setup();
    const pressed = vi.fn();
    const sent = vi.fn((event: FormEvent) => {
      event.preventDefault();
    });
    function Sending() {
      const [busy, setBusy] = useState(false);
      return (
        <form onSubmit={sent}>
          <Button
            type="submit"
            look="main"
            busy={busy}
            busyLabel="Placing the order"
            onClick={() => {
              pressed();
              setBusy(true);
            }}
          >
            Place order
          </Button>
        </form>
      );
    }
    render(<Sending />);
    await user.click(screen.getByRole("button", { name: "Place order" }));
    const busy = screen.getByRole("button", { name: "Placing the order" });
    await user.click(busy);
    await user.keyboard("{Enter}");
    expect(pressed).toHaveBeenCalledOnce();
    expect(sent).toHaveBeenCalledOnce();
    expect(document.activeElement).toBe(busy);
    expect(busy.getAttribute("aria-disabled")).toBe("true");
  });
});

interface Values {
  name: string;
  address: { postalCode: string };
}

function AddressForm({ refusal }: { refusal?: ApiProblem }) {
  const form = useForm<Values>({
    defaultValues: { name: "", address: { postalCode: "" } },
    shouldFocusError: false,
  });
  const { errors, submitCount } = form.formState;
  const send = form.handleSubmit(() => {
    if (refusal !== undefined) showRefusal(refusal, ["name", "address.postalCode"], form.setError);
  });
  return (
    <form noValidate onSubmit={(event) => void send(event)}>
      <ErrorSummary errors={formErrors(errors)} attempt={submitCount} />
      <TextField
        label="Name"
        hint="As on the receipt"
        autoComplete="name"
        error={errors.name?.message}
        {...form.register("name", { required: "Write your name." })}
      />
      <TextField
        label="ZIP code"
        inputMode="numeric"
        error={errors.address?.postalCode?.message}
        {...form.register("address.postalCode", { required: "Write the ZIP code." })}
      />
      <Button type="submit">Go on</Button>
    </form>
  );
}

describe("forms", () => {
  it("moves focus to the summary, links to the fields, ties each error to its field and loses nothing typed", async () => {
    const user = userEvent.setup();
    Element.prototype.scrollIntoView = vi.fn();
    render(<AddressForm />);
    await user.type(screen.getByRole("textbox", { name: "Name" }), "June Tallow");
    await user.click(screen.getByRole("button", { name: "Go on" }));
    const summary = await screen.findByRole("group", { name: "One thing to mend" });
    expect(document.activeElement).toBe(summary);
    const zip = screen.getByRole("textbox", { name: "ZIP code" });
    expect(zip.getAttribute("aria-invalid")).toBe("true");
    expect(described(zip)).toBe("Write the ZIP code.");
    await user.click(within(summary).getByRole("link", { name: "Write the ZIP code." }));
    expect(document.activeElement).toBe(zip);
    const name = screen.getByRole<HTMLInputElement>("textbox", { name: "Name" });
    expect(name.value).toBe("June Tallow");
    expect(name.getAttribute("aria-invalid")).toBe("false");
    expect(described(name)).toBe("As on the receipt");
  });

  it("shows the server's refusal at its field, and what has no field above the form", async () => {
    const user = userEvent.setup();
    const refusal = new ApiProblem({
      type: "/problems/validation",
      title: "Not all is filled in",
      status: 422,
      errors: [
        { path: "address.postalCode", message: "No freight goes there." },
        { path: "expectedTotalCents", message: "The price changed." },
      ],
    });
    render(<AddressForm refusal={refusal} />);
    await user.type(screen.getByRole("textbox", { name: "Name" }), "June Tallow");
    await user.type(screen.getByRole("textbox", { name: "ZIP code" }), "99999");
    await user.click(screen.getByRole("button", { name: "Go on" }));
    const summary = await screen.findByRole("group", { name: "2 things to mend" });
    expect(within(summary).getByText("The price changed.").closest("a")).toBeNull();
    expect(described(screen.getByRole("textbox", { name: "ZIP code" }))).toBe("No freight goes there.");
  });

  it("reads the unit with a number field and keeps digits as typed", async () => {
    const user = userEvent.setup();
    render(<NumberField label="Stroke" name="stroke" unit="in" unitName="inches" />);
    const field = screen.getByRole<HTMLInputElement>("textbox", { name: "Stroke" });
    await user.type(field, "3.7500");
    expect(field.value).toBe("3.7500");
    expect(field.inputMode).toBe("decimal");
    expect(described(field)).toBe("inches");
  });

  it("counts what is left of a text and keeps what is too long", async () => {
    const user = userEvent.setup();
    render(<TextArea label="Special request" name="request" most={5} optional />);
    const field = screen.getByRole<HTMLTextAreaElement>("textbox", { name: "Special request (optional)" });
    await user.type(field, "abc");
    expect(described(field)).toBe("2 of 5 characters left");
    await user.type(field, "defg");
    expect(described(field)).toBe("2 characters too many");
    expect(field.value).toBe("abcdefg");
  });
});

const bores: OptionRow[] = [
  { value: "a", name: "4.0000 in", effects: "−$60.00" },
  {
    value: "b",
    name: "4.1550 in",
    closed: {
      reason: "The wall would be too thin.",
      mend: <button type="button">Also change casting</button>,
    },
  },
  { value: "c", name: "4.1250 in" },
];

function Bores({ options = bores, onChoose }: { options?: OptionRow[]; onChoose: (value: string) => void }) {
  const [value, setValue] = useState<string | null>("a");
  return (
    <OptionList
      legend="Finished bore"
      name="bore"
      options={options}
      value={value}
      onChoose={(next) => {
        onChoose(next);
        setValue(next);
      }}
    />
  );
}

describe("OptionList", () => {
  it("keeps a closed option in reach of the arrows with its reason, but cannot be made to choose it", async () => {
    const user = userEvent.setup();
    const chosen = vi.fn();
    render(<Bores onChoose={chosen} />);
    const closed = screen.getByRole<HTMLInputElement>("radio", { name: "4.1550 in" });
    expect(closed.getAttribute("aria-disabled")).toBe("true");
    expect(described(closed)).toContain("Closed. The wall would be too thin.");

    screen.getByRole("radio", { name: "4.0000 in" }).focus();
    await user.keyboard("{ArrowDown}");
    expect(document.activeElement).toBe(closed);
    await user.keyboard(" ");
    await user.click(closed);
    expect(chosen).not.toHaveBeenCalled();
    expect(closed.checked).toBe(false);
    expect(screen.getByRole<HTMLInputElement>("radio", { name: "4.0000 in" }).checked).toBe(true);

    closed.focus();
    await user.keyboard("{ArrowDown}");
    expect(chosen.mock.calls).toEqual([["c"]]);
    await user.keyboard("{ArrowDown}");
    expect(chosen.mock.calls).toEqual([["c"], ["a"]]);
  });

  it("names the fieldset, reads the effects and offers the mend", () => {
    render(<Bores onChoose={vi.fn()} />);
    const group = screen.getByRole("group", { name: "Finished bore" });
    expect(within(group).getByRole("button", { name: "Also change casting" })).toBeTruthy();
    expect(described(within(group).getByRole("radio", { name: "4.0000 in" }))).toBe("−$60.00");
    expect(screen.queryByText(/One option is open/)).toBeNull();
  });

  it("says when just one option is open", () => {
    const closed = { reason: "Not with this casting." };
    render(
      <Bores
        options={bores.map((row) => (row.value === "c" ? row : { ...row, closed }))}
        onChoose={vi.fn()}
      />,
    );
    expect(screen.getByText(/One option is open/)).toBeTruthy();
  });
});

interface OrderRow {
  number: string;
  cents: number;
}

const orderColumns: Column<OrderRow>[] = [
  { id: "number", header: "Order", cell: (row) => row.number, sortBy: (row) => row.number },
  {
    id: "price",
    header: "Price",
    numeric: true,
    cell: (row) => String(row.cents),
    sortBy: (row) => row.cents,
    total: "1300",
  },
];

function setWidth(narrow: boolean) {
  vi.stubGlobal("matchMedia", () => ({
    matches: narrow,
    addEventListener: vi.fn(),
    removeEventListener: vi.fn(),
  }));
}

function Orders({ rows }: { rows: OrderRow[] }) {
  const { search } = useLocation();
  return (
    <>
      <DataTable
        caption="Placed orders"
        columns={orderColumns}
        rows={rows}
        rowId={(row) => row.number}
        rowLink={(row) => `/floor/orders/${row.number}`}
        empty={<p>No order is waiting.</p>}
      />
      <output>{search}</output>
    </>
  );
}

function renderOrders(rows: OrderRow[]) {
  render(
    <MemoryRouter initialEntries={["/floor?page=2"]}>
      <Routes>
        <Route path="/floor" element={<Orders rows={rows} />} />
        <Route path="/floor/orders/:number" element={<h1>One order</h1>} />
      </Routes>
    </MemoryRouter>,
  );
}

const orderRows = [
  { number: "K7", cents: 900 },
  { number: "A2", cents: 400 },
];

describe("DataTable", () => {
  it("sorts by the address bar, both ways, and goes back to the first page", async () => {
    setWidth(false);
    const user = userEvent.setup();
    renderOrders(orderRows);
    const numbers = () => screen.getAllByRole("rowheader").map((cell) => cell.textContent);
    expect(numbers()).toEqual(["K7", "A2", "Total"]);
    await user.click(screen.getByRole("link", { name: "Price" }));
    expect(numbers()).toEqual(["A2", "K7", "Total"]);
    expect(screen.getByRole("columnheader", { name: "Price" }).getAttribute("aria-sort")).toBe("ascending");
    await user.click(screen.getByRole("link", { name: "Price" }));
    expect(numbers()).toEqual(["K7", "A2", "Total"]);
    expect(screen.getByRole("status").textContent).toBe("?sort=-price");
  });

  it("links each row", async () => {
    setWidth(false);
    const user = userEvent.setup();
    renderOrders(orderRows);
    await user.click(screen.getByRole("link", { name: "A2" }));
    expect(screen.getByRole("heading", { name: "One order" })).toBeTruthy();
  });

  it("is a labelled list on phones", () => {
    setWidth(true);
    renderOrders(orderRows);
    expect(screen.queryByRole("table")).toBeNull();
    const first = screen.getAllByRole("listitem")[0];
    expect(first?.textContent).toBe("K7Price900");
    expect(screen.getByText("1300")).toBeTruthy();
  });

  it("says what to do next when it is empty", () => {
    setWidth(false);
    renderOrders([]);
    expect(screen.getByText("No order is waiting.")).toBeTruthy();
  });
});

describe("Menu", () => {
  it("opens, closes on Escape with focus on its button, and closes on choosing", async () => {
    const user = userEvent.setup();
    const chosen = vi.fn();
    render(
      <Menu label="June Tallow">
        <MenuEntry>
          <button type="button" onClick={chosen}>
            Sign out
          </button>
        </MenuEntry>
      </Menu>,
    );
    const opener = screen.getByRole("button", { name: "June Tallow" });
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
    await user.click(opener);
    await user.tab();
    await user.keyboard("{Escape}");
    expect(document.activeElement).toBe(opener);
    expect(opener.getAttribute("aria-expanded")).toBe("false");
    await user.click(opener);
    await user.click(screen.getByRole("button", { name: "Sign out" }));
    expect(chosen).toHaveBeenCalledOnce();
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
  });
});

describe("Announcer", () => {
  it("reads the same words again when they are said again", async () => {
    const user = userEvent.setup();
    function Teller() {
      const announce = useAnnounce();
      return (
        <Button
          onClick={() => {
            announce("Price $4,310.00");
          }}
        >
          Tell
        </Button>
      );
    }
    render(
      <Announcer>
        <Teller />
      </Announcer>,
    );
    const region = screen.getByRole("status");
    await user.click(screen.getByRole("button", { name: "Tell" }));
    const first = region.textContent;
    await user.click(screen.getByRole("button", { name: "Tell" }));
    expect(first.trim()).toBe("Price $4,310.00");
    expect(region.textContent.trim()).toBe("Price $4,310.00");
    expect(region.textContent).not.toBe(first);
  });
});

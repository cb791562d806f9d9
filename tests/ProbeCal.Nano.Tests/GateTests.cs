using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using Mono.Cecil;
using Mono.Cecil.Cil;
using ProbeCal.Nano.Tests.Gate;
using Xunit;

namespace ProbeCal.Nano.Tests;

/// <summary>The device assembly passes every rule that can be decided from its IL.</summary>
public class GateTests
{
    private static readonly string ReviewedDivisions = Path.Combine(DeviceAssembly.Root, "tests", "ProbeCal.Nano.Tests", "Divisions.tsv");

    [Fact]
    public void The_device_assembly_breaks_no_rule()
    {
        List<Breach> breaches = IlGate.Check(DeviceAssembly.Nano.MainModule.Types);
        Assert.True(breaches.Count == 0, string.Join("\n", breaches));
    }

    [Fact]
    public void Every_type_that_the_device_assembly_refers_to_exists_on_the_device()
    {
        List<string> missing = DeviceAssembly.Nano.MainModule.GetTypeReferences()
            .Where(type => DeviceAssembly.Mscorlib.MainModule.GetType(type.FullName) == null).Select(type => type.FullName).ToList();
        Assert.True(missing.Count == 0, string.Join("\n", missing));
    }

    [Fact]
    public void Every_allowed_member_exists_on_the_device()
    {
        foreach (string name in AllowedMembers.Members.Keys)
        {
            string type = name[..name.IndexOf("::", StringComparison.Ordinal)];
            TypeDefinition? definition = DeviceAssembly.Mscorlib.MainModule.GetType(type);
            Assert.True(definition != null && definition.Methods.Any(m => ReferenceRules.NameOf(m) == name), name);
        }
    }

    [Fact]
    public void Every_division_is_in_the_reviewed_list_with_a_reason()
    {
        List<Division> found = DivisionList.Found(DeviceAssembly.Nano.MainModule.GetTypes());
        if (DeviceAssembly.UpdateRequested)
        {
            DivisionList.Update(ReviewedDivisions, found);
        }
        List<Division> reviewed = DivisionList.Read(ReviewedDivisions);
        var unlisted = found.Select(d => d.Key).Except(reviewed.Select(d => d.Key)).Select(key => "not in the list: " + key);
        var stale = reviewed.Select(d => d.Key).Except(found.Select(d => d.Key)).Select(key => "no longer in the code: " + key);
        var open = reviewed.Where(d => d.Reason is Division.NotReviewed or "").Select(d => "no reason given: " + d.Key);
        List<string> wrong = unlisted.Concat(stale).Concat(open).ToList();
        Assert.True(wrong.Count == 0, "tests/ProbeCal.Nano.Tests/Divisions.tsv (PROBECAL_UPDATE=1 adds and drops rows; the reasons are for a person to give):\n" + string.Join("\n", wrong));
    }

    [Fact]
    public void A_division_by_a_constant_reviews_itself_and_another_does_not()
    {
        TypeDefinition type = DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Divisions");
        Dictionary<string, Division> found = DivisionList.Found([type]).ToDictionary(d => d.Method);
        Assert.Equal("the divisor is a constant", found["Divisions.ByConstant"].Reason);
        Assert.Equal(Division.NotReviewed, found["Divisions.ByArgument"].Reason);
        Assert.Equal("return (a / b) + (a % c);", found["Divisions.ByArgument"].Statement);
        Assert.Equal(2, found["Divisions.ByArgument"].Count);
        Assert.Equal(Division.NotReviewed, found["Divisions.ByZero"].Reason);
    }

    public static TheoryData<string, string> Rules => new()
    {
        { "generic-type", "GenericClass`1" },
        { "generic-type", "InvokesFunc" },
        { "generic-method", "GenericMethod" },
        { "generic-method", "CallsGenericMethod" },
        { "external-member", "InvokesAction" },
        { "default-interface-method", "IWithBody" },
        { "function-pointer", "FunctionPointer" },
        { "multidimensional-array", "MatrixField" },
        { "multidimensional-array", "MatrixLocal" },
        { "pointer", "PointerLocal" },
        { "structure", "Structure" },
        { "single-precision", "FloatField" },
        { "missing-member", "CallsMath" },
        { "external-type", "HoldsDecimal" },
        { "external-member", "UsesParse" },
        { "opcode", "CheckedAdd" },
        { "opcode", "Boxes" },
        { "opcode", "Float" },
        { "opcode", "Throws" },
        { "exception-handler", "Catches" },
        { "greater-than", "Greater" },
        { "greater-than", "GreaterOrEqual" },
        { "greater-than", "GreaterInLoop" },
        { "infinite-constant", "EqualsInfinity" },
        { "sign-cast", "ShiftAfterCast" },
        { "sign-cast", "RemainderAfterCast" },
        { "sign-cast", "WideningAfterCast" },
        { "sign-cast", "ReturnAfterCast" },
        { "sign-cast", "PassAfterCast" },
        { "sign-cast", "OutAfterCast" },
        { "initialiser", "ReadsAnother" },
        { "initialiser", "ReadsThroughACall" },
        { "allocation", "Allocates" },
        { "allocation", "AllocatesThroughACall" },
    };

    [Theory]
    [MemberData(nameof(Rules))]
    public void A_rule_fires_on_code_that_breaks_it(string rule, string fixture)
    {
        TypeDefinition type = DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Breaking." + fixture);
        Assert.NotNull(type);
        Assert.Contains(IlGate.Check([type]), breach => breach.Rule == rule);
    }

    [Fact]
    public void A_method_longer_than_a_branch_reaches_is_refused()
    {
        Assert.Contains(IlGate.Check([Crafted(il =>
        {
            for (int n = 0; n < 32768; n++)
            {
                il.Emit(OpCodes.Nop);
            }
            il.Emit(OpCodes.Ret);
        })]), breach => breach.Rule == "size");
    }

    [Fact]
    public void A_switch_of_more_cases_than_a_byte_counts_is_refused()
    {
        Assert.Contains(IlGate.Check([Crafted(il =>
        {
            Instruction end = il.Create(OpCodes.Ret);
            il.Emit(OpCodes.Ldc_I4_0);
            il.Emit(OpCodes.Switch, Enumerable.Repeat(end, 256).ToArray());
            il.Append(end);
        })]), breach => breach.Rule == "opcode");
    }

    [Fact]
    public void What_the_gate_does_not_know_it_refuses()
    {
        Assert.Contains(IlGate.Check([Crafted(il =>
        {
            il.Emit(OpCodes.Arglist);
            il.Emit(OpCodes.Ldobj, il.Body.Method.Module.TypeSystem.Double);
            il.Emit(OpCodes.Pop);
            il.Emit(OpCodes.Ret);
        })]), breach => breach.Rule == "unknown");
    }

    [Fact]
    public void No_rule_fires_on_code_that_keeps_them_all()
    {
        TypeDefinition type = DeviceAssembly.Tests.MainModule.GetType("ProbeCal.Nano.Tests.Fixtures.Keeping");
        Assert.Empty(IlGate.Check([type]));
    }

    /// <summary>A static class with one method, its IL written here: no compiler would write it.</summary>
    private static TypeDefinition Crafted(Action<ILProcessor> body)
    {
        ModuleDefinition module = ModuleDefinition.CreateModule("crafted", ModuleKind.Dll);
        var type = new TypeDefinition("", "Crafted", TypeAttributes.Abstract | TypeAttributes.Sealed, module.TypeSystem.Object);
        var method = new MethodDefinition("Run", MethodAttributes.Static, module.TypeSystem.Void);
        module.Types.Add(type);
        type.Methods.Add(method);
        body(method.Body.GetILProcessor());
        var stream = new MemoryStream();
        module.Write(stream);
        stream.Position = 0;
        return ModuleDefinition.ReadModule(stream).GetType("Crafted");
    }
}

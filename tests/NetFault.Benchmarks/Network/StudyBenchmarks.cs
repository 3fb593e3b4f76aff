using BenchmarkDotNet.Attributes;
using NetFault.Tests.Support;

namespace NetFault.Benchmarks.Network;

/// <summary>BenchmarkDotNet's view of the main job on generated grids: time with its error, allocations. Ratios are the other suites' work.</summary>
[MemoryDiagnoser]
public class StudyBenchmarks
{
    private NetFault.Network _network = null!;
    private string _text = null!;

    [Params(1_000, 10_000)]
    public int Buses { get; set; }

    [GlobalSetup]
    public void Setup()
    {
        _network = Grids.Meshed(Buses / 25, 25);
        _text = NetworkFile.ToText(_network);
    }

    [Benchmark(Baseline = true)]
    public object EveryBusInitial() => new FaultStudy(_network, new MachineDecrement { Instants = FaultInstants.InitialOnly }).EveryBus();

    [Benchmark]
    public object EveryBusThreeInstants() => new FaultStudy(_network, new MachineDecrement()).EveryBus();

    [Benchmark]
    public object EveryBusIec60909() => new FaultStudy(_network, new Iec60909()).EveryBus();

    [Benchmark]
    public object FlowsAtOneBus() => new FaultStudy(_network, new MachineDecrement()).FlowsAt("B0");

    [Benchmark]
    public object ParseFile() => NetworkFile.Parse(_text);
}

using System.Net;
using System.Net.Sockets;
using Microsoft.AspNetCore.Server.Kestrel.Core;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using MQTTnet.AspNetCore;
using TankChem.Monitoring.Configuration;
using TankChem.Monitoring.Ports;
using TankChem.Mqtt.Broker;
using TankChem.Mqtt.Outgoing;
using TankChem.Mqtt.Outside;
using TankChem.Mqtt.Payloads;

namespace TankChem.Mqtt;

/// <summary>Puts the MQTT room into a host.</summary>
public static class TankChemMqttExtensions
{
    /// <summary>Adds the brokers, the announcer and the counters. The host must add <see cref="IReadingIntake"/>, <see cref="IOperations"/>,
    /// <see cref="IFarm"/> and <see cref="TimeProvider"/>, and call <see cref="ListenTankChemMqtt"/> on its Kestrel.</summary>
    public static IServiceCollection AddTankChemMqtt(this IServiceCollection services, MqttSettings settings)
    {
        ArgumentNullException.ThrowIfNull(services);
        ArgumentNullException.ThrowIfNull(settings);
        services.AddSingleton(settings);
        services.AddSingleton<MqttCounters>();
        services.AddSingleton(new PayloadReader(settings.Mappings));
        services.AddSingleton(p => new Announcer(p.GetRequiredService<IFarm>(), settings, p.GetRequiredService<MqttCounters>(), p.GetRequiredService<TimeProvider>(), p.GetRequiredService<ILogger<Announcer>>()));
        services.AddSingleton<IAnnouncer>(p => p.GetRequiredService<Announcer>());
        services.AddSingleton(p => new MessageDoor(p.GetRequiredService<PayloadReader>(), p.GetRequiredService<IReadingIntake>(), p.GetRequiredService<IOperations>(), p.GetRequiredService<MqttCounters>()));
        if (settings.Embedded is not null)
        {
            services.AddSingleton<MqttConnectionHandler>();
            services.AddSingleton(p => new EmbeddedBroker(
                settings,
                p.GetRequiredService<MessageDoor>(),
                p.GetRequiredService<Announcer>(),
                p.GetRequiredService<MqttConnectionHandler>(),
                p.GetRequiredService<MqttCounters>(),
                p.GetRequiredService<TimeProvider>(),
                p.GetRequiredService<IHostApplicationLifetime>(),
                p.GetRequiredService<ILogger<EmbeddedBroker>>()));
            services.AddHostedService(p => p.GetRequiredService<EmbeddedBroker>());
        }

        if (settings.Outside is { } outside)
        {
            services.AddSingleton(p => new OutsideBroker(
                outside,
                settings,
                p.GetRequiredService<MessageDoor>(),
                p.GetRequiredService<Announcer>(),
                p.GetRequiredService<TimeProvider>(),
                p.GetRequiredService<ILogger<OutsideBroker>>()));
            services.AddHostedService(p => p.GetRequiredService<OutsideBroker>());
        }

        return services;
    }

    /// <summary>Opens the embedded broker's listener; nothing when there is no embedded broker. Port 0 takes a free one, told by <see cref="EmbeddedBroker.Port"/>.</summary>
    /// <exception cref="InvalidOperationException">The address is none of this machine alone.</exception>
    public static void ListenTankChemMqtt(this KestrelServerOptions kestrel)
    {
        ArgumentNullException.ThrowIfNull(kestrel);
        if (kestrel.ApplicationServices.GetRequiredService<MqttSettings>().Embedded is not { } options)
            return;
        EmbeddedBroker broker = kestrel.ApplicationServices.GetRequiredService<EmbeddedBroker>();
        foreach (IPAddress address in Addresses(options))
            kestrel.Listen(address, options.Port, broker.Attach);
    }

    private static IPAddress[] Addresses(EmbeddedBrokerOptions options)
    {
        if (options.Bind == "localhost")
            return options.Port != 0 && Socket.OSSupportsIPv6 ? [IPAddress.Loopback, IPAddress.IPv6Loopback] : [IPAddress.Loopback];
        if (IPAddress.TryParse(options.Bind.Trim('[', ']'), out IPAddress? address) && IPAddress.IsLoopback(address))
            return [address];
        throw new InvalidOperationException(
            $"mqtt.embedded.bind: {options.Bind} would be reachable from other machines, and there is no sign-in yet: anybody on the network could send readings. Listen on 127.0.0.1, localhost or [::1].");
    }
}
